import { writeFileSync } from 'node:fs';
import { designSchemaText } from './design-schema';

/** `npm run -s schema`: writes public/design.schema.json from the schema that reads design files. */
writeFileSync(new URL('../../public/design.schema.json', import.meta.url), designSchemaText());
