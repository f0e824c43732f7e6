/** The frame that never changes during a run: band above, sheet between, answers and Stop below; on a wide screen the way and the record beside it. */
import { useState } from 'react';
import type { ReactNode } from 'react';
import { ScrollView, useWindowDimensions, View } from 'react-native';

import { AnswerDock } from '@/shared/ui/components/AnswerDock';
import { Page } from '@/shared/ui/components/Page';
import { StopBar } from '@/shared/ui/components/StopBar';
import { StudRail } from '@/shared/ui/components/StudRail';
import { NotTakenNotice } from '@/shared/ui/screens/run/NotTakenNotice';
import { RefusalNotice } from '@/shared/ui/screens/run/RefusalNotice';
import { studOf } from '@/shared/ui/screens/run/studOf';
import { RunBand } from '@/shared/ui/screens/run/RunBand';
import { RecordSide } from '@/shared/ui/screens/run/RecordSide';
import type { Run } from '@/shared/ui/screens/run/Run';
import { WayDialog } from '@/shared/ui/screens/run/WayDialog';
import { WayList } from '@/shared/ui/screens/run/WayList';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  run: Run;
  /** the answers, in the thumb's reach */
  dock?: ReactNode;
  /** false once the run is closed and there is nothing left to stop */
  stop?: boolean;
  children: ReactNode;
}

/** From this window width on the way stands left and the record right of the step. */
const columnsFrom = 1000;

/** Every step of a run is shown inside it. */
export function RunFrame({ run, dock, stop = true, children }: Props) {
  const { colors } = useTheme();
  const columns = useWindowDimensions().width >= columnsFrom;
  const [way, setWay] = useState(false);
  const { view, send } = run;
  const pressStop = () => {
    setWay(false);
    void send({ type: 'STOP' });
  };
  const foot = (
    <>
      {dock || run.refusal ? (
        // a dock that is taller than a small screen scrolls in itself: Stop is never pushed away
        <ScrollView style={{ flexGrow: 0, flexShrink: 1 }}>
          <AnswerDock>
            <RefusalNotice run={run} />
            {dock}
          </AnswerDock>
        </ScrollView>
      ) : null}
      {stop && !columns ? <StopBar onPress={pressStop} /> : null}
    </>
  );
  const centre = (
    <Page bleed maxWidth={720} foot={foot}>
      <StudRail
        number={studOf(run)}
        state={view.builtIn ? 'close' : 'now'}
        above={view.phase !== 'opening'}
        below={view.phase !== 'closed'}
        next={view.end === null}
        grow
      >
        <NotTakenNotice run={run} />
        {children}
      </StudRail>
    </Page>
  );
  const side = (which: ReactNode, edge: 'left' | 'right', width: number) => (
    <ScrollView
      role="complementary"
      style={{
        flexGrow: 0,
        flexShrink: 0,
        width,
        backgroundColor: colors.raised,
        [edge === 'left' ? 'borderRightWidth' : 'borderLeftWidth']: line.rule,
        borderColor: colors.ink,
      }}
      contentContainerStyle={{ padding: space.l, gap: space.xl }}
    >
      {which}
    </ScrollView>
  );
  return (
    <View style={{ flex: 1, minHeight: 0, backgroundColor: colors.paper }}>
      <RunBand run={run} onPressPlace={() => setWay(true)} />
      <View style={{ flex: 1, minHeight: 0, flexDirection: 'row' }}>
        {columns ? side(<WayList run={run} />, 'left', 300) : null}
        <View style={{ flex: 1, minWidth: 0, minHeight: 0 }}>{centre}</View>
        {columns ? side(<RecordSide run={run} />, 'right', 340) : null}
      </View>
      {stop && columns ? <StopBar onPress={pressStop} /> : null}
      {way ? <WayDialog run={run} onClose={() => setWay(false)} foot={stop ? <StopBar onPress={pressStop} /> : null} /> : null}
    </View>
  );
}
