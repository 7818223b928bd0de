import type { Knex } from 'knex';
import { createTable, freezeChildren, freezeColumns, makeAppendOnly, refuseInserts, uniqueWhere } from '../dialect';

const frozenColumns = [
  'kit_id',
  'letter',
  'circuit',
  'guide',
  'content',
  'content_hash',
  'sent_by',
  'sent_at',
  'verdict',
  'created_by',
];
const moves = [
  'draft>draft',
  'draft>in-check',
  'in-check>in-check',
  'in-check>draft',
  'in-check>held',
  'in-check>released',
  'held>held',
  'released>released',
  'released>withdrawn',
  'withdrawn>withdrawn',
];
const badMove = `(old.state || '>' || new.state) not in (${moves.map((move) => `'${move}'`).join(', ')})`;
/** Only a draft changes; calling a version back empties what was frozen. */
const frozenChange = `(old.state <> 'draft' and new.state <> 'draft' and (${frozenColumns
  .map((column) => `new.${column} is not old.${column}`)
  .join(' or ')}))`;
/** Nothing is released that nobody signed for, under the very hash it has. */
const unsigned = `(new.state = 'released' and not exists (select 1 from sign_offs where sign_offs.version_id = new.id and sign_offs.decision = 'released' and sign_offs.content_hash = new.content_hash))`;

/** Kits, their versions and lines, and the decisions of the check room. */
export async function up(sql: Knex): Promise<void> {
  await createTable(sql, 'kits', (table) => {
    table.string('id').primary();
    table.string('code').notNullable().unique();
    table.integer('number').notNullable().unique();
    table.string('name').notNullable();
    table.text('summary').notNullable();
    table.string('audience').notNullable();
    table.integer('age_from').notNullable().checkBetween([3, 99], 'kit_age');
    table.string('band_code').notNullable();
    table.text('band').notNullable();
    table.string('created_by').notNullable().references('people.id').index('kits_by_creator');
    table.integer('created_at').notNullable();
  });

  await createTable(sql, 'versions', (table) => {
    table.string('id').primary();
    table.string('kit_id').notNullable().references('kits.id');
    table.string('letter').notNullable();
    table
      .string('state')
      .notNullable()
      .checkIn(['draft', 'in-check', 'held', 'released', 'withdrawn'], 'version_state');
    table.string('based_on_id').references('versions.id').index('versions_by_base');
    /** Circuit form, winding, assumptions of aerial, earth and stray. */
    table.text('circuit').notNullable();
    table.text('guide').notNullable();
    table.integer('save_no').notNullable();
    table.string('created_by').notNullable().references('people.id').index('versions_by_creator');
    table.integer('created_at').notNullable();
    table.integer('updated_at').notNullable();
    /** Everything the version is, frozen when it is sent to check; its hash is what a sign-off names. */
    table.text('content');
    table.string('content_hash');
    table.string('sent_by').references('people.id').index('versions_by_sender');
    table.integer('sent_at');
    /** The server's own verdict on the frozen content. */
    table.text('verdict');
    table.unique(['kit_id', 'letter']);
    table.index(['state', 'sent_at'], 'versions_by_state');
    table.check("(state = 'draft') = (content is null)", [], 'version_frozen_unless_draft');
    table.check('(content is null) = (content_hash is null)', [], 'version_hash_with_content');
  });
  await createTable(sql, 'version_editors', (table) => {
    table.string('version_id').notNullable().references('versions.id');
    table.string('person_id').notNullable().references('people.id').index('version_editors_by_person');
    table.integer('at').notNullable();
    table.primary(['version_id', 'person_id']);
  });
  await makeAppendOnly(sql, 'version_editors');

  await createTable(sql, 'lines', (table) => {
    table.string('id').primary();
    table.string('version_id').notNullable().references('versions.id');
    /** What the guide and the board call it: L1, C1, D1. */
    table.string('reference').notNullable();
    table.string('place').notNullable();
    table.string('part_id').references('parts.id').index('lines_by_part');
    /** Pieces; millimetres for a part measured in metres; milligrams for one measured in grams. */
    table.integer('quantity').notNullable().checkBetween([1, 1_000_000], 'line_quantity');
    table.string('note').notNullable();
    table.integer('position').notNullable();
    table.integer('save_no').notNullable();
    table.unique(['version_id', 'reference']);
  });
  await freezeChildren(
    sql,
    'lines',
    (row) => `(select state from versions where id = ${row}.version_id) <> 'draft'`,
    'a version that was sent to check keeps its lines',
  );

  await createTable(sql, 'sign_offs', (table) => {
    table.string('id').primary();
    table.string('version_id').notNullable().references('versions.id').index('sign_offs_by_version');
    table.string('decision').notNullable().checkIn(['released', 'held', 'withdrawn'], 'sign_off_decision');
    table.string('person_id').notNullable().references('people.id').index('sign_offs_by_person');
    table.integer('at').notNullable();
    table.string('content_hash').notNullable();
    table.string('engine_version').notNullable();
    table.string('rules_version').notNullable();
    table.text('verdict').notNullable();
    /** The checker's written reason for each note finding, by code and path. */
    table.text('reasons').notNullable();
    table.text('remark').notNullable();
  });
  await makeAppendOnly(sql, 'sign_offs');
  await uniqueWhere(sql, 'sign_offs', 'one_release_a_version', ['version_id'], "decision = 'released'");
  await refuseInserts(sql, 'versions', "new.state <> 'draft'", 'a version begins as a draft');
  await freezeColumns(
    sql,
    'versions',
    ['state', ...frozenColumns],
    `${badMove} or ${frozenChange} or ${unsigned}`,
    'a version that was sent to check keeps its content, and moves only as the check room decided',
  );
}

export async function down(sql: Knex): Promise<void> {
  for (const table of ['sign_offs', 'lines', 'version_editors', 'versions', 'kits']) await sql.schema.dropTable(table);
}
