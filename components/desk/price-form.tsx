'use client';

import { useState } from 'react';
import type { Action } from '@/components/forms/action-result';
import { Button } from '@/components/ui/button';
import { FieldError, TextField } from '@/components/ui/field';
import { shopCurrency } from '@/services/catalogue/rules';
import { type PricedKit, SetPrice } from '@/services/catalogue/schemas';
import { formatMoney, parseMoney } from '@/services/money';
import { type ProblemView, fieldsOf } from './typed-steps';
import type { TypedStep } from './typed-steps';

/** What a kit costs, step by step. What is typed stays until it is right. */
export function PriceForm({ kit, onSet }: { kit: PricedKit; onSet: Action<SetPrice, void> }) {
  const [steps, setSteps] = useState<TypedStep[]>(() =>
    kit.prices.length === 0
      ? [{ from: '1', price: '' }]
      : kit.prices.map(({ fromQuantity, unit }) => ({
          from: `${fromQuantity}`,
          price: formatMoney(unit).replace(/[^\d.]/g, ''),
        })),
  );
  const [problem, setProblem] = useState<ProblemView | null>(null);
  const [said, setSaid] = useState('');
  const [isPending, setPending] = useState(false);

  const change = (index: number, next: Partial<TypedStep>) =>
    setSteps(steps.map((step, at) => (at === index ? { ...step, ...next } : step)));

  async function send() {
    setSaid('');
    const parsed = SetPrice.safeParse({
      kitId: kit.kitId,
      steps: steps.map(({ from, price }) => ({
        fromQuantity: Number(from),
        unit: parseMoney(price, shopCurrency) ?? price,
      })),
    });
    if (!parsed.success) return setProblem(fieldsOf(parsed.error));
    setPending(true);
    const answer = await onSet(parsed.data);
    setPending(false);
    setProblem(answer.ok ? null : answer.problem);
    if (answer.ok) setSaid(`${kit.name} is on sale at ${formatMoney(parsed.data.steps[0]?.unit ?? kit.cost)}.`);
  }

  const errorAt = (path: string) =>
    Object.entries(problem?.fields ?? {}).find(([name]) => name === path || name.startsWith(`${path}.`))?.[1];
  return (
    <div className="grid gap-3">
      {steps.map((step, index) => (
        <div key={index} className="flex flex-wrap items-start gap-x-3">
          <TextField
            label="From, kits"
            inputMode="numeric"
            figures
            value={step.from}
            error={errorAt(`steps.${index}.fromQuantity`)}
            onChange={(event) => change(index, { from: event.target.value })}
            frameClassName="w-32"
          />
          <TextField
            label="Each, tax included"
            inputMode="decimal"
            figures
            unit="£"
            value={step.price}
            error={errorAt(`steps.${index}.unit`)}
            onChange={(event) => change(index, { price: event.target.value })}
            frameClassName="w-44"
          />
          {index > 0 && (
            <Button variant="quiet" className="sm:mt-7" onClick={() => setSteps(steps.filter((_, at) => at !== index))}>
              Remove<span className="sr-only"> the step from {step.from} kits</span>
            </Button>
          )}
        </div>
      ))}
      {problem && !problem.fields && <FieldError>{problem.sentence}</FieldError>}
      <p role="status" className="font-semibold text-pine empty:hidden">
        {said}
      </p>
      <div className="flex flex-wrap gap-3">
        <Button variant="primary" pending={isPending} onClick={send}>
          Set the price<span className="sr-only"> of {kit.name}</span>
        </Button>
        {steps.length < 6 && (
          <Button icon="plus" onClick={() => setSteps([...steps, { from: '', price: '' }])}>
            Add a step
          </Button>
        )}
      </div>
    </div>
  );
}
