import { z } from 'zod';
import { Design } from '../receiver';

const DESCRIPTION =
  'A receiver as it is handed to the evaluation: SI units everywhere, each physical value a number or a number with its spread. Rules that tie two keys together (such as a tap that a coupling asks for) are not in this schema; the evaluation names them by their paths.';

/** JSON Schema of the design file, written from the schema that reads it. The identifier is relative: it holds wherever the file is served. */
function designSchema(): Record<string, unknown> {
  const { $schema, ...rest } = z.toJSONSchema(Design, { io: 'input' });
  return { $schema, $id: 'design.schema.json', title: 'Coilyard design file', description: DESCRIPTION, ...rest };
}

/** The schema as it stands in its file. */
export function designSchemaText(): string {
  return `${JSON.stringify(designSchema(), null, 1)}\n`;
}
