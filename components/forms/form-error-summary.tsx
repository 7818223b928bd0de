'use client';

import { ErrorPanel } from '@/components/ui/notice';
import { ErrorSummary } from '@/components/ui/error-summary';
import type { ProblemView } from '@/services/problem';
import type { SummaryLine } from './use-action-form';

/** At the head of a form: what to mend, with links to the fields; or what broke, with its number and the work kept. */
export function FormErrorSummary(props: {
  summary: { attempt: number; errors: readonly SummaryLine[] };
  problem: ProblemView | null;
}) {
  const { summary, problem } = props;
  if (problem?.id !== undefined) {
    return (
      <ErrorPanel title="Not sent" reference={problem.id}>
        {problem.sentence}
      </ErrorPanel>
    );
  }
  return <ErrorSummary {...summary} />;
}
