export interface FakeStripeOptions {
  /** 0, the default, takes any free port. */
  port?: number;
  host?: string;
  /** Where signed events are posted; without it events can only be listed. */
  webhook?: string;
  /** Several secrets sign each event several times, as during a rotation. */
  secret?: string | string[];
  /** The address a browser uses, when it is not http://host:port. */
  publicUrl?: string;
  /** The provider asks for 30 minutes at least; a test may ask for less. */
  minExpirySeconds?: number;
  /** Waits between attempts at an event the endpoint has not answered with 2xx. */
  retryDelaysMs?: number[];
  /** JSON file that keeps everything over a restart. */
  stateFile?: string;
  log?: (line: string) => void;
}

export interface Settings {
  webhook: string | undefined;
  secrets: string[];
  minExpirySeconds: number;
  retryDelaysMs: number[];
  stateFile: string | undefined;
  log: (line: string) => void;
}

const DEFAULT_SECRET = 'whsec_demo_secret_of_the_stand_in';
const MIN_EXPIRY_SECONDS = 30 * 60;
export const MAX_EXPIRY_SECONDS = 24 * 60 * 60;
const QUICK_RETRIES_MS = [25, 50, 100, 200];

export function settingsOf(options: FakeStripeOptions): Settings {
  return {
    webhook: options.webhook,
    secrets: [options.secret ?? DEFAULT_SECRET].flat(),
    minExpirySeconds: options.minExpirySeconds ?? MIN_EXPIRY_SECONDS,
    retryDelaysMs: options.retryDelaysMs ?? QUICK_RETRIES_MS,
    stateFile: options.stateFile,
    log: options.log ?? (() => undefined),
  };
}
