import { useRouteError } from 'react-router';
import { Failure } from '../../ui/panel.tsx';
import { Waiting } from '../waiting.tsx';

/** When a page can't even be begun. It stands alone: what failed may be what other pages are made of. */
export function ErrorRoute() {
  const error = useRouteError();
  return (
    <>
      <title>Not shown · Antinode</title>
      <Waiting />
      <main className="mx-auto max-w-[40rem] px-4 pt-12">
        <Failure error={error} retry={() => window.location.reload()} />
        <p className="mt-4">
          <a href="/" className="text-copper underline underline-offset-2">
            To the desk
          </a>
        </p>
      </main>
    </>
  );
}
