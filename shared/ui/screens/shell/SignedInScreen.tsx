/** The frame of every page behind the door: nobody passes without a session, and the places are at hand. */
import { Redirect, Slot, usePathname } from 'expo-router';
import type { Href } from 'expo-router';
import { View } from 'react-native';

import { useMe } from '@/shared/ui/api/queries';
import { ErrorState } from '@/shared/ui/components/ErrorState';
import { Loading } from '@/shared/ui/components/Loading';
import { Page } from '@/shared/ui/components/Page';
import { PlacesFrame } from '@/shared/ui/components/PlacesFrame';
import { doorFor } from '@/shared/ui/screens/shell/doorFor';
import { whatToDo } from '@/shared/ui/screens/shell/Fetched';
import { isRun, placeOf, places } from '@/shared/ui/screens/shell/places';

/** Shows the page of the address, or sends to the door with the way back. */
export function SignedInScreen() {
  const pathname = usePathname();
  const me = useMe();
  // nobody is led away from a bench that may be live: a run's own page says what it needs, and Stop works without a session
  const run = isRun(pathname);
  const door = run ? null : doorFor(me.error?.problem.code ?? null, pathname, globalThis.location?.search ?? '');
  const shown = run || me.data !== undefined;
  return (
    <PlacesFrame places={places} current={placeOf(pathname)} bare={run || !shown}>
      {door === null ? null : <Redirect href={door as Href} />}
      {shown ? null : (
        <Page>
          {me.error && door === null ? (
            <ErrorState happened={me.error.problem.say} todo={whatToDo(me.error.problem)} onRetry={() => void me.refetch()} />
          ) : (
            <Loading what="the workshop" />
          )}
        </Page>
      )}
      {/* stays mounted behind all of this: without its pages the router forgets where the address leads */}
      <View style={shown ? { flex: 1, minHeight: 0 } : { display: 'none' }}>
        <Slot />
      </View>
    </PlacesFrame>
  );
}
