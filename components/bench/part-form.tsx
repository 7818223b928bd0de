'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import type { Action } from '@/components/forms/action-result';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { TextArea, TextField } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { Select } from '@/components/ui/select';
import { formatMoney, money, parseMoney } from '@/services/money';
import { ChangePart, NewPart, PART_KINDS, type PartView, partKinds } from '@/services/parts/schemas';
import { type FieldSentences, Problem, type ProblemView, parse } from '@/services/problem';
import { currentPart, PartConflict } from './part-conflict';
import { PartField, type TypedValues } from './part-field';
import { fieldsOf, firstEarphone, firstValues } from './part-fields';
import { PartPicture } from './part-picture';
import { QuantityField } from './quantity-field';
import { asValues, idOf, pictured, sentencesOf } from './typed-part';

export type PartFormProps =
  { part: null; addPart: Action<NewPart, PartView> } | { part: PartView; changePart: Action<ChangePart, PartView> };

/** A part's form: fields by its kind, units as people write them. What the schema refuses stands at its field. */
export function PartForm(props: PartFormProps) {
  const { part } = props;
  const [code, setCode] = useState(part?.code ?? '');
  const [name, setName] = useState(part?.name ?? '');
  const [grams, setGrams] = useState<number | null>(part ? part.massMilligrams / 1000 : null);
  const [price, setPrice] = useState(part ? formatMoney(part.cost).replace(/[^0-9.]/g, '') : '');
  const [note, setNote] = useState(part?.note ?? '');
  const [values, setValues] = useState<TypedValues>(part ? { ...part.values } : { ...firstValues('coil-former') });
  const [basedOn, setBasedOn] = useState(part?.saveNo ?? 0);
  const [errors, setErrors] = useState<FieldSentences>({});
  const [attempt, setAttempt] = useState(0);
  const [problem, setProblem] = useState<ProblemView | null>(null);
  const [isSending, setSending] = useState(false);
  const [isSaved, setSaved] = useState(false);
  const router = useRouter();
  const kind = PART_KINDS.find((one) => one === values.kind) ?? 'hardware';
  const { unit } = partKinds[kind];

  function change(key: string, value: unknown) {
    setSaved(false);
    if (key === 'earphoneKind' && (value === 'ceramic') !== (values['earphoneKind'] === 'ceramic')) {
      setValues({ ...firstEarphone(value === 'ceramic' ? 'ceramic' : 'magnetic'), earphoneKind: value });
      return;
    }
    const { [key]: _before, ...others } = values;
    setValues(value === undefined ? { ...others, kind: values.kind } : { ...values, [key]: value });
  }

  const fail = (fields: FieldSentences) => {
    setErrors(fields);
    setAttempt(attempt + 1);
  };

  async function send() {
    setProblem(null);
    const cost = parseMoney(price, 'GBP');
    // Nothing stands for what is missing, so that everything else that is wrong is said with it.
    const about = {
      name,
      massMilligrams: grams === null ? 0 : Math.round(grams * 1000),
      cost: cost ?? money(0, 'GBP'),
      note,
      values,
    };
    const missing: FieldSentences = {
      ...(grams === null && { massMilligrams: 'Give the mass in grams; packing checks the box by it.' }),
      ...(cost === null && { cost: 'Give the cost like 1.25.' }),
    };
    const wrong = {
      ...(part === null ? sentencesOf(NewPart, { code, ...about }) : sentencesOf(NewPart.omit({ code: true }), about)),
      ...missing,
    };
    if (Object.keys(wrong).length > 0) return fail(wrong);
    setSending(true);
    try {
      const answer =
        props.part === null
          ? await props.addPart(parse(NewPart, { code, ...about }))
          : await props.changePart(parse(ChangePart, { partId: props.part.id, basedOn, ...about }));
      if (answer.ok) {
        setErrors({});
        if (props.part === null) router.push(`/bench/parts/${answer.value.id}`);
        else {
          setBasedOn(answer.value.saveNo);
          setSaved(true);
          router.refresh();
        }
      } else {
        setProblem(answer.problem);
        fail(answer.problem.fields ?? {});
      }
    } catch (error) {
      if (!(error instanceof Problem)) throw error;
      fail(error.fields ?? { form: error.message });
    } finally {
      setSending(false);
    }
  }

  const theirs = problem?.kind === 'conflict' ? currentPart(problem.current) : null;
  return (
    <form
      noValidate
      className="grid max-w-4xl content-start gap-6"
      onSubmit={(event) => {
        event.preventDefault();
        void send();
      }}
    >
      <ErrorSummary
        attempt={attempt}
        errors={Object.entries(errors).map(([path, sentence]) => ({
          sentence,
          ...(path !== 'form' && { fieldId: idOf(path) }),
        }))}
      />
      {theirs && (
        <PartConflict
          mine={{ name, values, price }}
          theirs={theirs}
          onMine={() => {
            setBasedOn(theirs.saveNo);
            setProblem(null);
          }}
          onTheirs={() => {
            setName(theirs.name);
            setGrams(theirs.massMilligrams / 1000);
            setPrice(formatMoney(theirs.cost).replace(/[^0-9.]/g, ''));
            setNote(theirs.note);
            setValues({ ...theirs.values });
            setBasedOn(theirs.saveNo);
            setProblem(null);
          }}
        />
      )}
      {problem && !theirs && !problem.fields && (
        <Notice kind="stops" title="Not saved" live="alert">
          {problem.sentence}
        </Notice>
      )}
      <div className="grid gap-4 sm:grid-cols-[12rem_minmax(0,1fr)]">
        {part === null ? (
          <TextField
            id="part-code"
            label="Code"
            hint="Its name for good."
            value={code}
            onChange={(event) => setCode(event.target.value)}
            error={errors['code']}
          />
        ) : (
          <div>
            <p className="mb-1 font-bold">Code</p>
            <p className="font-figures text-value font-semibold">{part.code}</p>
          </div>
        )}
        <TextField
          id="part-name"
          label="Name"
          value={name}
          onChange={(event) => setName(event.target.value)}
          error={errors['name']}
        />
      </div>
      <div className="grid items-start gap-4 sm:grid-cols-3">
        {part === null ? (
          <Select
            label="Kind"
            value={kind}
            options={PART_KINDS.map((one) => ({ value: one, label: partKinds[one].label }))}
            onChange={(event) => {
              const next = PART_KINDS.find((one) => one === event.target.value);
              if (next) setValues({ ...firstValues(next) });
            }}
          />
        ) : (
          <div>
            <p className="mb-1 font-bold">Kind</p>
            <p>{partKinds[kind].label}</p>
          </div>
        )}
        <QuantityField
          id="part-massMilligrams"
          label={unit === 'metre' ? 'Mass of one metre' : 'Mass of one piece'}
          unit="g"
          value={grams}
          onChange={setGrams}
          check={(value) => (value >= 0 && value <= 100_000 ? null : 'Between 0 and 100 000 g.')}
          error={errors['massMilligrams']}
        />
        <TextField
          id="part-cost"
          label={unit === 'metre' ? 'Cost of one metre' : 'Cost of one piece'}
          unit="£"
          figures
          inputMode="decimal"
          value={price}
          onChange={(event) => setPrice(event.target.value)}
          error={errors['cost'] ?? errors['cost.minor']}
        />
      </div>
      <Panel title="Values" note="Write them as you say them: 235u, 0.235m, 365p." ground="open" level={2}>
        <div className="mb-3">
          <PartPicture values={pictured(values, kind)} width={72} />
        </div>
        {fieldsOf(asValues(values, kind)).length === 0 && <p>This kind has no electrical or mechanical values.</p>}
        <div className="grid gap-4">
          {fieldsOf(asValues(values, kind)).map((field) => (
            <PartField key={`${kind} ${field.key}`} field={field} values={values} errors={errors} onChange={change} />
          ))}
        </div>
      </Panel>
      <TextArea
        label="Note"
        optional
        rows={2}
        maxLength={300}
        value={note}
        onChange={(event) => setNote(event.target.value)}
        error={errors['note']}
      />
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" variant="primary" pending={isSending} pendingLabel="Saving">
          {part === null ? 'Add the part' : 'Save the part'}
        </Button>
        <span role="status" aria-live="polite" className="text-caption text-ink2">
          {isSaved ? 'Saved. Drafts that use it show the new verdict; sent versions keep the old values.' : ''}
        </span>
      </div>
    </form>
  );
}
