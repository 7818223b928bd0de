import type { Instrumentation } from 'next';

/** Before the first request: a missing or bad variable stops the start with a sentence that names it. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { parseEnv } = await import('./services/env');
    try {
      parseEnv(process.env);
    } catch (error) {
      console.error(error instanceof Error ? error.message : error);
      process.exit(1);
    }
  }
}

/** A path as the log may keep it: no query, and nothing as long as the secret of a link. */
export const withoutSecrets = (path: string): string => (path.split('?')[0] ?? '').replace(/[\w-]{40,}/g, '(secret)');

/** A page that broke: the number its reader sees, and where. */
export const onRequestError: Instrumentation.onRequestError = async (error, request, context) => {
  const { log } = await import('./services/log');
  const digest = typeof error === 'object' && error !== null && 'digest' in error ? error.digest : undefined;
  log().error(
    { errorId: digest, error, path: withoutSecrets(request.path), route: context.routePath },
    'a page failed',
  );
};
