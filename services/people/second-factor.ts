import * as OTPAuth from 'otpauth';
import QRCode from 'qrcode';
import type { Instant } from '../time';
import type { QrView } from './schemas';

/** RFC 6238 with what every authenticator takes: SHA-1, six figures, a new code every 30 s. */
const form = { algorithm: 'SHA1', digits: 6, period: 30 } as const;
const periodMs = form.period * 1000;

const totp = (secret: string, label = 'staff') =>
  new OTPAuth.TOTP({ ...form, issuer: 'Coilyard', label, secret: OTPAuth.Secret.fromBase32(secret) });

/** 160 random bits as the 32 letters and figures that an authenticator takes. */
export const newFactor = (): string => new OTPAuth.Secret({ size: 20 }).base32;

export const factorFromBytes = (bytes: Uint8Array): string =>
  new OTPAuth.Secret({ buffer: Uint8Array.from(bytes).buffer }).base32;

export const codeAt = (secret: string, at: Instant): string => totp(secret).generate({ timestamp: at });

/**
 * The step a code belongs to, or null when it fits none of the step before, this one and the next.
 * @param after the last step accepted: that one and older ones are used up
 */
export function stepOf(secret: string, code: string, at: Instant, after: number): number | null {
  const delta = totp(secret).validate({ token: code, timestamp: at, window: 1 });
  if (delta === null) return null;
  const step = Math.floor(at / periodMs) + delta;
  return step > after ? step : null;
}

export const enrolmentUri = (secret: string, email: string): string => totp(secret, email).toString();

/** Dark squares as one path: what a page can draw without markup made from text. */
export function qrOf(text: string): QrView {
  const { size, data } = QRCode.create(text, { errorCorrectionLevel: 'M' }).modules;
  let path = '';
  for (let index = 0; index < data.length; index++) {
    if (data[index]) path += `M${index % size} ${Math.floor(index / size)}h1v1h-1z`;
  }
  return { size, path };
}
