import { DeskSkeleton, DeskView } from '../../features/desk/desk-view.tsx';
import { PageTitle } from '../../ui/heading.tsx';
import { Panel } from '../../ui/panel.tsx';
import { Shell } from '../shell.tsx';
import { SignedIn } from '../signed-in.tsx';

export function DeskRoute() {
  return (
    <Shell title="Desk">
      <PageTitle>Waits on you</PageTitle>
      <SignedIn>
        {() => (
          <Panel fallback={<DeskSkeleton />}>
            <DeskView />
          </Panel>
        )}
      </SignedIn>
    </Shell>
  );
}
