import type { Desk } from '@strandnote/api/contract';
import type { Tx } from '@strandnote/db';
import { sql } from 'drizzle-orm';

type Moved = Desk['moved'][number];
interface SurveyedSpan extends Record<string, unknown> {
  cable_id: string;
  reference: string;
  structure_name: string;
  starts_on: string;
  tension: number;
  low: number;
  high: number;
  steel_temperature: number | null;
  turn: number;
}

/** At most this many are shown: more than that is a survey to look at as a whole, not a list of cables. */
const shown = 50;

/**
 * Cables whose tension in the last campaign differs from that in the campaign before by more than both intervals together:
 * the intervals do not meet. The same temperature is not assumed, so that both are given.
 */
export async function movedCables(tx: Tx): Promise<Moved[]> {
  const { rows } = await tx.execute<SurveyedSpan>(sql`
    with latest as (
      select distinct on (e.firm_id, e.span_id, e.campaign_id) e.span_id, g.structure_id, g.starts_on, g.number,
        (e.output ->> 'tension')::float8 as tension,
        (e.output #>> '{interval95,0}')::float8 as low,
        (e.output #>> '{interval95,1}')::float8 as high,
        coalesce(m.steel_temperature, g.steel_temperature) as steel_temperature
      from estimates e
      join campaigns g on g.firm_id = e.firm_id and g.id = e.campaign_id
      join measurements m on m.firm_id = e.firm_id and m.id = e.measurement_id
      order by e.firm_id, e.span_id, e.campaign_id, m.visited_at desc, e.created_at desc
    ), turns as (
      select latest.*, (row_number() over (partition by span_id order by starts_on desc, number desc))::int as turn from latest
    )
    select c.id as cable_id, c.reference, t.name as structure_name, turns.starts_on, turns.tension, turns.low, turns.high,
      turns.steel_temperature, turns.turn, turns.span_id
    from turns
    join spans s on s.id = turns.span_id
    join cables c on c.firm_id = s.firm_id and c.id = s.cable_id
    join structures t on t.firm_id = c.firm_id and t.id = c.structure_id
    where turns.turn <= 2
    order by t.name, c.position, c.reference, turns.span_id, turns.turn`);
  const moved: Moved[] = [];
  for (const [index, before] of rows.entries()) {
    const after = rows[index - 1];
    if (before.turn !== 2 || !after || after.span_id !== before.span_id) continue;
    if (after.low <= before.high && before.low <= after.high) continue;
    const { cable_id: cableId, reference, structure_name: structureName } = after;
    moved.push({ cableId, reference, structureName, before: surveyOf(before), after: surveyOf(after) });
  }
  return moved.slice(0, shown);
}

function surveyOf(row: SurveyedSpan): Moved['before'] {
  return { tension: row.tension, interval95: [row.low, row.high], startsOn: row.starts_on, steelTemperature: row.steel_temperature };
}
