/** A reading of a record on its scale, in the prefix that suits it. */
import { ReadingScale } from '@/shared/ui/components/ReadingScale';
import type { ReadingLine } from '@/shared/ui/screens/records/readingsOf';
import { scaleOf } from '@/shared/ui/screens/records/scaleOf';

/** Limits, guard bands and needle as they were judged. */
export function RecordScale({ reading }: { reading: ReadingLine }) {
  const { factor, unit } = scaleOf(reading);
  const by = (n: number | null) => (n === null ? null : n * factor);
  return (
    <ReadingScale
      value={by(reading.needle)}
      low={by(reading.low)}
      high={by(reading.high)}
      guard={reading.guard * factor}
      nominal={by(reading.nominal)}
      unit={unit}
    />
  );
}
