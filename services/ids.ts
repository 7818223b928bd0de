import { z } from 'zod';

/** 128 random bits, written with 26 characters that survive being read aloud. */
const alphabet = '0123456789abcdefghjkmnpqrstvwxyz';

export function newId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(26));
  let id = '';
  for (const byte of bytes) id += alphabet.charAt(byte & 31);
  return id;
}

/** A link secret: 256 random bits in base64url. Only its hash is stored. */
export function newToken(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(32));
  return btoa(String.fromCharCode(...bytes))
    .replaceAll('+', '-')
    .replaceAll('/', '_')
    .replaceAll('=', '');
}

const id = <Name extends string>(name: Name) =>
  z
    .string()
    .regex(/^[0-9a-hjkmnp-tv-z]{26}$/, `This is not the id of a ${name}.`)
    .brand(name);

export const PersonId = id('person');
export const PartId = id('part');
export const KitId = id('kit');
export const VersionId = id('version');
export const LineId = id('line');
export const LotId = id('lot');
export const BinId = id('bin');
export const OrderId = id('order');
export const BoxId = id('box');
export const ShipmentId = id('shipment');
export type PersonId = z.infer<typeof PersonId>;
export type PartId = z.infer<typeof PartId>;
export type KitId = z.infer<typeof KitId>;
export type VersionId = z.infer<typeof VersionId>;
export type LineId = z.infer<typeof LineId>;
export type LotId = z.infer<typeof LotId>;
export type BinId = z.infer<typeof BinId>;
export type OrderId = z.infer<typeof OrderId>;
export type BoxId = z.infer<typeof BoxId>;
export type ShipmentId = z.infer<typeof ShipmentId>;
