import { Link } from 'react-router';
import type { RevisionEvent } from '../../../schemas/api.ts';
import { paths } from '../../app/paths.ts';
import { Time } from '../../ui/time.tsx';

interface ActivityListProps {
  readonly study: string;
  readonly activity: readonly RevisionEvent[];
}

/** What happened to the sheets, newest first: who, what, when, why. */
export function ActivityList({ study, activity }: ActivityListProps) {
  if (activity.length === 0) return <p className="text-pencil">Nothing has happened yet.</p>;
  return (
    <ol className="border-t border-rule">
      {activity.map((event, index) => (
        <li key={index} className="grid gap-x-5 border-b border-rule py-2 sm:grid-cols-[8.5rem_1fr]">
          <span className="text-pencil">
            <Time iso={event.time} />
          </span>
          <span>
            {event.person.name} {event.event}{' '}
            <Link
              to={paths.revision.href(study, event.number, event.revision)}
              className="text-copper underline underline-offset-2"
            >
              {event.number} rev {event.revision}
            </Link>
            {event.note !== '' && <span className="block text-pencil">{event.note}</span>}
          </span>
        </li>
      ))}
    </ol>
  );
}
