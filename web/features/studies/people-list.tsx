import type { StudyDetail } from '../../../schemas/api.ts';

export function PeopleList({ people }: Pick<StudyDetail, 'people'>) {
  return (
    <ul className="border-t border-rule">
      {people.map(({ person, roles }) => (
        <li key={person.id} className="flex flex-wrap justify-between gap-x-4 border-b border-rule py-2">
          <span>
            {person.name} <span className="block text-[0.8125rem] text-pencil">{person.email}</span>
          </span>
          <span className="text-pencil">{roles.join(', ')}</span>
        </li>
      ))}
    </ul>
  );
}
