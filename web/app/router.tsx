import type { QueryClient } from '@tanstack/react-query';
import { createBrowserRouter } from 'react-router';
import { deskOptions } from '../features/desk/api/get-desk.ts';
import { revisionOptions } from '../features/revision/api/get-revision.ts';
import { revisionListOptions } from '../features/revision/api/list-revisions.ts';
import { sessionOptions } from '../features/session/api/get-session.ts';
import { studyOptions } from '../features/studies/api/get-study.ts';
import { tokenListOptions } from '../features/tokens/api/list-tokens.ts';
import { begin, requireSession } from './loading.ts';
import { paths } from './paths.ts';
import { DeskRoute } from './routes/desk.tsx';
import { DeviceRoute } from './routes/device.tsx';
import { ErrorRoute } from './routes/error.tsx';
import { NotFoundRoute } from './routes/not-found.tsx';
import { SignInRoute } from './routes/sign-in.tsx';
import { StudyRoute } from './routes/study.tsx';
import { TokensRoute } from './routes/tokens.tsx';
import { Waiting } from './waiting.tsx';

/** Loaders see to the session and start the queries of a page; the cache owns what comes back. */
export function makeRouter(queryClient: QueryClient) {
  const signedIn = (start: (params: Readonly<Record<string, string | undefined>>) => void) => {
    return async ({ request, params }: { request: Request; params: Readonly<Record<string, string | undefined>> }) => {
      await requireSession(queryClient, request);
      start(params);
      return null;
    };
  };
  return createBrowserRouter([
    {
      ErrorBoundary: ErrorRoute,
      HydrateFallback: Waiting,
      children: [
        {
          path: paths.signIn.pattern,
          loader: () => void begin(queryClient.query(sessionOptions())),
          Component: SignInRoute,
        },
        {
          path: paths.desk.pattern,
          loader: signedIn(() => begin(queryClient.query(deskOptions()))),
          Component: DeskRoute,
        },
        {
          path: paths.study.pattern,
          loader: signedIn(({ study = '' }) => begin(queryClient.query(studyOptions(study)))),
          Component: StudyRoute,
        },
        {
          path: paths.sheet.pattern,
          loader: signedIn(({ study = '', number = '' }) =>
            begin(queryClient.query(revisionListOptions(study, number))),
          ),
          lazy: { Component: async () => (await import('./routes/newest.tsx')).NewestRoute },
        },
        {
          path: paths.revision.pattern,
          loader: signedIn(({ study = '', number = '', revision = '' }) => {
            begin(queryClient.query(revisionOptions({ study, number, revision })));
            begin(queryClient.query(studyOptions(study)));
          }),
          // Reports bring KaTeX and its like: loaded with the first of them.
          lazy: { Component: async () => (await import('./routes/revision.tsx')).RevisionRoute },
        },
        { path: paths.device.pattern, loader: signedIn(() => undefined), Component: DeviceRoute },
        {
          path: paths.tokens.pattern,
          loader: signedIn(() => begin(queryClient.query(tokenListOptions()))),
          Component: TokensRoute,
        },
        {
          path: paths.verify.pattern,
          lazy: { Component: async () => (await import('./routes/verify.tsx')).VerifyRoute },
        },
        { path: '*', Component: NotFoundRoute },
      ],
    },
  ]);
}
