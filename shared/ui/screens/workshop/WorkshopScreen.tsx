/** The workshop: who is signed in, how the pages look, and the lists that belong to all. */
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { useWindowDimensions, View } from 'react-native';

import type { Me } from '@/shared/contract/session';
import { useMe } from '@/shared/ui/api/queries';
import { useSession } from '@/shared/ui/api/useSession';
import { Button } from '@/shared/ui/components/Button';
import { Choice } from '@/shared/ui/components/Choice';
import { Notice } from '@/shared/ui/components/Notice';
import { Page } from '@/shared/ui/components/Page';
import { FactRows } from '@/shared/ui/screens/shell/FactRows';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { LinkRows } from '@/shared/ui/screens/shell/LinkRows';
import { Section } from '@/shared/ui/screens/shell/Section';
import { isWide } from '@/shared/ui/theme/space';
import type { SchemeChoice } from '@/shared/ui/theme/schemeChoice';
import { useTheme } from '@/shared/ui/theme/useTheme';

const schemes = [
  { value: 'light', label: 'Sheet', detail: 'dark ink on paper, for daylight' },
  { value: 'dark', label: 'Night bench', detail: 'light ink, for a dim workshop' },
  { value: 'system', label: 'As the device', detail: 'follows its own setting' },
];

/** On a phone the workings are found here too. */
export function WorkshopScreen() {
  const me = useMe();
  const { choice, setChoice } = useTheme();
  const wide = isWide(useWindowDimensions().width);
  return (
    <Page title={me.data?.workshop.name ?? 'Workshop'} eyebrow="Workshop" maxWidth={860}>
      <Fetched query={me} what="the workshop">
        {(data) => (
          <>
            <LinkRows
              caption="Of the workshop"
              rows={[
                ...(wide ? [] : [{ href: '/workings' as const, title: 'Workings', about: 'Bench calculations with formula and source' }]),
                { href: '/workshop/instruments', title: 'Instruments', about: 'Meters and testers, their accuracy and calibration' },
                { href: '/workshop/people', title: 'People and roles', about: 'Who works here and what each may do' },
                { href: '/workshop/settings', title: 'Settings of the workshop', about: 'Limits and times, beside the house rules' },
              ]}
            />
            <SignedInAs me={data} />
            <Section title="Look of the pages">
              <View style={{ maxWidth: 430 }}>
                <Choice label="Look" options={schemes} value={choice} onChange={(value) => setChoice(value as SchemeChoice)} />
              </View>
            </Section>
          </>
        )}
      </Fetched>
    </Page>
  );
}

function SignedInAs({ me }: { me: Me }) {
  const router = useRouter();
  const { signOut } = useSession();
  const [problem, setProblem] = useState<string | null>(null);
  const leave = async () => {
    const answer = await signOut();
    if (answer.kind === 'problem') setProblem(answer.say);
    else router.replace('/sign-in');
  };
  return (
    <Section title="Signed in">
      <FactRows
        caption="Signed in"
        rows={[
          { name: 'Name', value: `${me.person.name} (${me.person.code})` },
          { name: 'Mail address', value: me.person.mail },
          { name: 'Roles here', value: me.roles.join(', ') || 'none' },
        ]}
      />
      <LinkRows caption="Account" rows={[{ href: '/workshop/account', title: 'My account', about: 'Where you are signed in, and your password' }]} />
      <View style={{ alignItems: 'flex-start' }}>
        <Button label="Sign out" onPress={() => void leave()} />
      </View>
      {problem ? <Notice live>{`${problem} You are still signed in.`}</Notice> : null}
    </Section>
  );
}
