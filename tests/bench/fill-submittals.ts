import type { Pool, PoolConnection } from 'mysql2/promise';
import type { CheckResult } from '#rules/engine/finding';

export const findingsPerSubmittal = 50;
const contractors = 20;
const submittalsPerInsert = 5_000;

/** UUIDs in the order of their numbers; the table's own letter keeps those of two tables apart. */
const idOf = (table: string, number: number) =>
  `${number.toString(16).padStart(8, '0')}-0000-7000-8000-${table.padStart(12, '0')}`;
const idSql = (table: string, number: string) =>
  `CONCAT(LPAD(LOWER(HEX(${number})), 8, '0'), '-0000-7000-8000-${table.padStart(12, '0')}')`;

export const agency = { kind: 'agency', organisationId: idOf('a', 0) } as const;
export const contractorOf = (submittal: number) => idOf('a', 1 + (submittal % contractors));
export const revisionOf = (submittal: number) => idOf('e', submittal);

interface Fill {
  submittals: number;
  /** The submittal whose check has its evidence: with all of them it would be many times the size of the rest. */
  measured: number;
  result: CheckResult;
}

/** One agency with many contractors' submittals, a revision, a check and fifty findings each, over one year. */
export async function fillSubmittals(pool: Pool, { submittals, measured, result }: Fill): Promise<void> {
  const connection = await pool.getConnection();
  try {
    // Rows that nothing here joins are left out.
    await connection.query('SET SESSION foreign_key_checks = 0, unique_checks = 0');
    await fillOrganisations(connection);
    for (let from = 1; from <= submittals; from += submittalsPerInsert) {
      const to = Math.min(submittals, from + submittalsPerInsert - 1);
      await fillRange(connection, { from, to, measured, result });
    }
    await connection.query('ANALYZE TABLE submittals, revisions, checks, findings');
  } finally {
    connection.release();
  }
}

async function fillOrganisations(connection: PoolConnection): Promise<void> {
  await connection.query(
    `INSERT INTO organisations
       (id, name, slug, kind, time_zone, review_working_days, waiver_policy, letterhead, created_at)
     SELECT ${idSql('a', 'seq')}, CONCAT('Organisation ', seq), CONCAT('organisation-', seq),
       IF(seq = 0, 'agency', 'contractor'), 'UTC', 10, 'advisory', '{}', '2026-01-05'
     FROM seq_0_to_${contractors}`,
  );
  await connection.query(
    `INSERT INTO projects (id, agency_id, number, title, facts, created_at)
     SELECT ${idSql('b', 'seq')}, ${idSql('a', '0')}, CONCAT('CV-', seq), CONCAT('Road ', seq), '{}', '2026-01-05'
     FROM seq_0_to_99`,
  );
}

async function fillRange(
  connection: PoolConnection,
  { from, to, measured, result }: { from: number; to: number } & Pick<Fill, 'measured' | 'result'>,
): Promise<void> {
  const sequence = `seq_${from}_to_${to}`;
  const tenant = `${idSql('a', '0')}, ${idSql('a', `1 + seq % ${contractors}`)}`;
  const at = `'2026-01-05' + INTERVAL seq * 5 MINUTE`;
  await connection.query(
    `INSERT INTO submittals (id, agency_id, contractor_id, project_id, section_id, mix_designation,
       active_designation, latest_number, agency_updated_at, created_by_id, created_at, updated_at)
     SELECT ${idSql('c', 'seq')}, ${tenant}, ${idSql('b', 'seq % 100')}, ${idSql('b', '0')},
       CONCAT('M-', seq), CONCAT('M-', seq), 0, ${at}, ${idSql('a', '0')}, ${at}, ${at}
     FROM ${sequence}`,
  );
  await connection.query(
    `INSERT INTO revisions (id, submittal_id, agency_id, contractor_id, number, state, laboratory_id, section,
       workbook_file_id, uploaded_by_id, uploaded_at, created_at, updated_at)
     SELECT ${idSql('e', 'seq')}, ${idSql('c', 'seq')}, ${tenant}, 0,
       ELT(1 + seq % 4, 'submitted', 'in review', 'returned', 'withdrawn'), ${idSql('a', '0')}, '{}',
       ${idSql('a', '0')}, ${idSql('a', '0')}, ${at}, ${at}, ${at}
     FROM ${sequence}`,
  );
  await connection.query(
    `INSERT INTO checks (id, revision_id, agency_id, contractor_id, kind, number, made_at, submitted_on, context,
       record_hash, resolved_hash, engine_version, seal, summary, result)
     SELECT ${idSql('f', 'seq')}, ${idSql('e', 'seq')}, ${tenant}, 'check of record', 1, ${at}, '2026-01-05', ?,
       SHA2(seq, 256), SHA2('edition', 256), '1', SHA2(seq, 256), ?, IF(seq = ?, ?, '{}')
     FROM ${sequence}`,
    [
      JSON.stringify({ submittedOn: '2026-01-05', lettingOn: null, facts: {} }),
      JSON.stringify(result.summary),
      measured,
      JSON.stringify(result),
    ],
  );
  await connection.query(
    `INSERT INTO findings (id, check_id, revision_id, agency_id, contractor_id, position, rule, subject, clause,
       severity, outcome, borderline, rounded, margin)
     SELECT CONCAT(LPAD(LOWER(HEX(outer_seq.seq)), 8, '0'), '-', LPAD(LOWER(HEX(place.seq)), 4, '0'),
         '-7000-8000-000000000009'),
       ${idSql('f', 'outer_seq.seq')}, ${idSql('e', 'outer_seq.seq')}, ${idSql('a', '0')},
       ${idSql('a', `1 + outer_seq.seq % ${contractors}`)}, place.seq, CONCAT('rule-', place.seq), 'design point',
       CONCAT('412.', place.seq), 'required', IF(place.seq % 9 = 0, 'fail', 'pass'), 0, place.seq, 0.5
     FROM ${sequence} AS outer_seq CROSS JOIN seq_0_to_${findingsPerSubmittal - 1} AS place`,
  );
}
