'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import type { Action } from '@/components/forms/action-result';
import { ReachRail } from '@/components/charts/reach-rail';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { TextArea, TextField } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import type { KitId, VersionId } from '@/services/ids';
import { NewKit } from '@/services/kits/schemas';
import { type FieldSentences, Problem, parse } from '@/services/problem';
import { bandChoices, ownBand } from './band-choice';
import { QuantityField } from './quantity-field';

type Made = { kitId: KitId; versionId: VersionId };

/** A new kit: what it is called, whom it is for, and the band it promises. */
export function NewKitForm({ nextNumber, createKit }: { nextNumber: number; createKit: Action<NewKit, Made> }) {
  const router = useRouter();
  const [texts, setTexts] = useState({
    name: '',
    code: '',
    number: String(nextNumber),
    summary: '',
    audience: '',
    ageFrom: '10',
  });
  const [bandId, setBandId] = useState('MW-1');
  const [own, setOwn] = useState({ lo: 526_500, hi: 1_003_500, step: 9_000 });
  const [errors, setErrors] = useState<FieldSentences>({});
  const [attempt, setAttempt] = useState(0);
  const [isSending, setSending] = useState(false);
  const band = bandChoices.find(({ id }) => id === bandId)?.band ?? ownBand(own.lo, own.hi, own.step);

  const field = (name: keyof typeof texts) => ({
    id: `kit-${name}`,
    value: texts[name],
    onChange: (event: { target: { value: string } }) => setTexts({ ...texts, [name]: event.target.value }),
    error: errors[name],
  });

  async function send() {
    const asked = { ...texts, number: Number(texts.number), ageFrom: Number(texts.ageFrom), band };
    const failed = (fields: FieldSentences) => {
      setErrors(fields);
      setAttempt(attempt + 1);
    };
    let kit: NewKit;
    try {
      kit = parse(NewKit, asked);
    } catch (error) {
      if (!(error instanceof Problem)) throw error;
      failed(error.fields ?? { form: error.message });
      return;
    }
    setSending(true);
    const answer = await createKit(kit);
    if (answer.ok) router.push(`/bench/${answer.value.versionId}`);
    else {
      setSending(false);
      failed(answer.problem.fields ?? { form: answer.problem.sentence });
    }
  }

  return (
    <form
      className="grid max-w-measure gap-5"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        void send();
      }}
    >
      <ErrorSummary
        attempt={attempt}
        errors={Object.entries(errors).map(([path, sentence]) => ({
          sentence,
          ...(path !== 'form' && { fieldId: path.startsWith('band') ? 'kit-band' : `kit-${path}` }),
        }))}
      />
      <TextField label="Name" hint="As it stands on the lid." {...field('name')} />
      <div className="grid gap-5 sm:grid-cols-2">
        <TextField label="Number" hint="On the plate." inputMode="numeric" figures {...field('number')} />
        <TextField label="Code" hint="In serials, like MW7: without I and O." {...field('code')} />
      </div>
      <TextArea label="What it is" hint="One or two sentences for the catalogue." rows={3} {...field('summary')} />
      <div className="grid gap-5 sm:grid-cols-[1fr_9rem]">
        <TextField label="Who it is for" {...field('audience')} />
        <TextField label="Age from" inputMode="numeric" figures unit="years" {...field('ageFrom')} />
      </div>
      <Select
        id="kit-band"
        label="Band"
        hint="The region is your choice; it is never guessed from an address."
        value={bandId}
        onChange={(event) => setBandId(event.target.value)}
        error={Object.entries(errors).find(([path]) => path.startsWith('band'))?.[1]}
        options={[
          { group: 'Long and medium wave', options: bandChoices.slice(0, 4).map(optionOf) },
          { group: 'Short wave', options: bandChoices.slice(4).map(optionOf) },
          { group: 'Other', options: [{ value: 'own', label: 'Own edges' }] },
        ]}
      />
      {bandId === 'own' && (
        <div className="grid gap-4 sm:grid-cols-3">
          <QuantityField label="From" unit="kHz" value={own.lo} onChange={(lo) => setOwn({ ...own, lo })} />
          <QuantityField label="To" unit="kHz" value={own.hi} onChange={(hi) => setOwn({ ...own, hi })} />
          <QuantityField
            label="Carrier every"
            unit="kHz"
            value={own.step}
            onChange={(step) => setOwn({ ...own, step })}
          />
        </div>
      )}
      {band.lo < band.hi && <ReachRail size="card" band={band} nominal={null} worst={null} />}
      <div>
        <Button type="submit" variant="primary" pending={isSending} pendingLabel="Starting the kit">
          Start the kit
        </Button>
      </div>
    </form>
  );
}

const optionOf = ({ id, label, detail }: (typeof bandChoices)[number]) => ({ value: id, label: `${label}: ${detail}` });
