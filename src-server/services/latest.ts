/** Of numbered versions, the latest of each thing that they are versions of. */
export function latestBy<Row extends { readonly no: number }>(
  rows: readonly Row[],
  thingOf: (row: Row) => string,
): Map<string, Row> {
  const latest = new Map<string, Row>()
  for (const row of rows) {
    const held = latest.get(thingOf(row))
    if (held === undefined || held.no < row.no) latest.set(thingOf(row), row)
  }
  return latest
}
