import { z } from 'zod';

/** As the order keeps it: what the buyer typed, in lines, and the country as two letters. */
const StoredAddress = z.object({
  lines: z.array(z.string()),
  town: z.string().default(''),
  postcode: z.string().default(''),
  country: z.string().default(''),
});

/** The lines of a label, top to bottom, without empty ones. */
export function addressLines(stored: string): string[] {
  const { lines, town, postcode, country } = StoredAddress.parse(JSON.parse(stored));
  return [...lines, [town, postcode].filter((part) => part !== '').join(', '), country].filter((line) => line !== '');
}
