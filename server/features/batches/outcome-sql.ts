/** Faults found on batch `b` with outcome `o`, worst first, as a JSON array. */
export const FOUND_JSON = `coalesce((select jsonb_agg(jsonb_build_object('fault', e.key, 'severity', e.value::int) order by e.value::int desc, e.key)
      from jsonb_each_text(o.outcomes) e where e.value::int > 0), '[]')`;

/**
 * Money lost on batch `b`, minor units: a second lost the difference between the two prices, a bar that was
 * reworked, embedded or thrown away the whole first price; one kept lost nothing. 0 while prices are not known.
 */
export const LOST_MINOR = `coalesce((select sum(case
        when w.kind = 'seconds' then w.bars * (p.first_price_minor - p.second_price_minor)
        when w.kind in ('rebatch', 'embeds', 'discarded') then w.bars * p.first_price_minor
        else 0 end)::int
      from disposition w join workshop p on p.id = w.workshop_id where w.workshop_id = b.workshop_id and w.batch_id = b.id), 0)`;
