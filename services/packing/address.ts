import { Address } from '../orders/schemas';

/** The lines of a label, top to bottom, without empty ones; the country stands alone on the last. */
export function addressLines(stored: string): string[] {
  const { line1, line2, town, postcode, country } = Address.parse(JSON.parse(stored));
  const place = [town, postcode].filter((part) => part !== '').join(', ');
  return [line1, line2, place, country].filter((line) => line !== '');
}
