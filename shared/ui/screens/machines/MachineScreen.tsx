/** The dossier of one machine. */
import { View } from 'react-native';

import { useMachine, useMe } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Notice } from '@/shared/ui/components/Notice';
import { Page } from '@/shared/ui/components/Page';
import { Tag } from '@/shared/ui/components/Tag';
import { MachineHistory } from '@/shared/ui/screens/machines/MachineHistory';
import { plateRows } from '@/shared/ui/screens/machines/profileRows';
import { ProfileTables } from '@/shared/ui/screens/machines/ProfileTables';
import { releaseWord } from '@/shared/ui/screens/machines/releaseWord';
import { StaysFitted } from '@/shared/ui/screens/machines/StaysFitted';
import { Columns } from '@/shared/ui/screens/shell/Columns';
import { FactRows } from '@/shared/ui/screens/shell/FactRows';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { Section } from '@/shared/ui/screens/shell/Section';
import { space } from '@/shared/ui/theme/space';

/** Plate, limits and what is left on it at the side; rails, returns, parts and history in the middle. */
export function MachineScreen({ machineId }: { machineId: string }) {
  const dossier = useMachine(machineId);
  const roles = useMe().data?.roles ?? [];
  const leads = roles.includes('restorer') || roles.includes('senior');
  const machine = dossier.data?.machine;
  return (
    <Page
      title={machine?.name ?? 'Machine'}
      eyebrow={machine ? `Machine · serial ${machine.serial} · profile revision ${machine.revision}` : undefined}
      aside={machine?.openRun ? <Tag word="run open" kind="now" /> : null}
      maxWidth={1280}
    >
      <Fetched query={dossier} what="the machine">
        {({ machine: m, profile, runs, releases, staysFitted }) => (
          <Columns
            side={
              <>
                <View style={{ gap: space.xs }}>
                  {m.openRun ? (
                    <Notice>
                      <BodyText>A run is open on this machine. One run at a time works on it.</BodyText>
                      <LinkText label="To the open run" href={`/bench/${m.openRun}`} />
                    </Notice>
                  ) : leads ? (
                    <LinkText label="Start a run on this machine" href={`/bench?machine=${m.id}`} />
                  ) : null}
                </View>
                <StaysFitted tags={staysFitted} profile={profile.document} />
                <Section title="Owner’s limits" look="label">
                  {profile.document.ownerLimits.length > 0 ? (
                    profile.document.ownerLimits.map((limit) => <BodyText key={limit}>{limit}</BodyText>)
                  ) : (
                    <BodyText tone="soft">The owner has set none.</BodyText>
                  )}
                </Section>
                <Section title="Plate" look="label">
                  <FactRows caption="Plate" rows={[...plateRows(profile.document), { name: 'Release', value: releaseWord(m.release) }]} />
                </Section>
              </>
            }
          >
            <ProfileTables profile={profile.document} />
            <MachineHistory runs={runs} releases={releases} />
          </Columns>
        )}
      </Fetched>
    </Page>
  );
}
