/** The instruments of the workshop. */
import { View } from 'react-native';

import type { Instrument } from '@/shared/contract/instruments';
import { useInstruments } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import type { Column } from '@/shared/ui/components/DataTable';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Mono } from '@/shared/ui/components/Mono';
import { Page } from '@/shared/ui/components/Page';
import { Tag } from '@/shared/ui/components/Tag';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { INSTRUMENT_KINDS_IN_WORDS, functionsOf } from '@/shared/ui/screens/workshop/instrumentWords';
import { space } from '@/shared/ui/theme/space';

const columns: Column<Instrument>[] = [
  {
    key: 'name',
    title: 'Instrument',
    grow: 1.6,
    cell: (i) => (
      <View>
        <BodyText bold>{i.name}</BodyText>
        <BodyText size="small" tone="soft">{`${INSTRUMENT_KINDS_IN_WORDS[i.kind]}, serial ${i.serial}`}</BodyText>
      </View>
    ),
  },
  { key: 'tag', title: 'Sticker', grow: 0.7, cell: (i) => <Mono>{i.tag}</Mono> },
  {
    key: 'ranges',
    title: 'Reads, accuracy',
    grow: 3.2,
    cell: (i) => (
      <View>
        {i.ranges.length === 0 ? <BodyText tone="soft">shows a state, no figures</BodyText> : null}
        {functionsOf(i.ranges).map((one) => (
          <BodyText key={one.name}>
            {`${one.name} `}
            <Mono inline>{one.accuracy}</Mono>
            {`; ranges ${one.ranges}`}
          </BodyText>
        ))}
      </View>
    ),
  },
  {
    key: 'category',
    title: 'Category',
    grow: 0.9,
    cell: (i) => <BodyText tone={i.category ? 'ink' : 'soft'}>{i.category ?? 'none'}</BodyText>,
  },
  {
    key: 'poles',
    title: 'Proves dead',
    grow: 0.9,
    cell: (i) => <BodyText tone={i.twoPole ? 'ink' : 'soft'}>{i.twoPole ? 'two-pole' : 'no'}</BodyText>,
  },
  {
    key: 'until',
    title: 'Calibrated until',
    grow: 1.2,
    cell: (i) => (
      <View style={{ gap: space.xs }}>
        <Mono whole>{i.calibratedUntil}</Mono>
        {i.outOfDate ? <Tag word="out of date" kind="look" /> : null}
      </View>
    ),
  },
];

/** Read-only; an instrument out of date is marked and cannot be used for a reading. */
export function InstrumentsScreen() {
  const instruments = useInstruments();
  return (
    <Page title="Instruments" eyebrow="Workshop" maxWidth={1280}>
      <Fetched query={instruments} what="the instruments">
        {({ instruments: all }) => (
          <DataTable
            caption="Instruments"
            columns={columns}
            rows={all}
            rowKey={(i) => i.id}
            empty={
              <EmptyState
                title="No instruments yet"
                text="The keeper of the workshop enters meters and testers with their accuracy and calibration date."
              />
            }
          />
        )}
      </Fetched>
      <LinkText label="Workshop" href="/workshop" />
    </Page>
  );
}
