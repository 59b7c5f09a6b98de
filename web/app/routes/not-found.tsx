import { NotFound } from '../missing.tsx';
import { Shell } from '../shell.tsx';

export function NotFoundRoute() {
  return (
    <Shell title="Not found">
      <NotFound />
    </Shell>
  );
}
