import { Link } from 'react-router';
import type { RevisionSummary } from '../../../schemas/api.ts';
import { paths } from '../../app/paths.ts';
import { standingOf, StandingWord } from '../../report/standing.tsx';
import { formatUtilisation } from '../../report/utilisation.tsx';
import { count } from '../../lib/words.ts';
import { StateCurve } from '../../ui/state-curve.tsx';
import { StateWord } from '../../ui/state-word.tsx';

const HEADS = ['Number', 'Title', 'Rev', 'State', 'Governs', 'Holds', 'Remarks', 'Waits on'] as const;

/** The register: one row a sheet. On a narrow screen each row becomes a small card. */
export function SheetRegister({ sheets }: { readonly sheets: readonly RevisionSummary[] }) {
  return (
    <table className="register w-full border-collapse">
      <thead>
        <tr className="border-b border-ink text-left text-pencil">
          {HEADS.map((head) => (
            <th key={head} scope="col" className="py-2 pr-5 font-normal last:pr-0">
              {head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {sheets.map((sheet) => (
          <SheetRow key={sheet.number} sheet={sheet} />
        ))}
      </tbody>
    </table>
  );
}

function SheetRow({ sheet }: { readonly sheet: RevisionSummary }) {
  const cell = 'py-3 pr-5 align-middle';
  return (
    <tr className="relative border-b border-rule hover:bg-wash">
      <th scope="row" className={`${cell} text-left font-semibold whitespace-nowrap`}>
        <Link
          to={paths.revision.href(sheet.study, sheet.number, sheet.revision)}
          className="after:absolute after:inset-0 hover:text-copper"
        >
          {sheet.number}
        </Link>
      </th>
      <td className={`${cell} register-title font-serif text-base`}>{sheet.title}</td>
      <td className={cell} data-head="Rev">
        {sheet.revision}
      </td>
      <td className={cell} data-head="State">
        <span className="flex items-center gap-3">
          <StateCurve state={sheet.state} size="small" />
          <StateWord state={sheet.state} />
        </span>
      </td>
      <td className={cell} data-head="Governs">
        <Governing sheet={sheet} />
      </td>
      <td className={cell} data-head="Holds">
        {sheet.holds === 0 ? <Dash /> : <span className="font-semibold text-ochre-ink">◔ {sheet.holds}</span>}
      </td>
      <td className={cell} data-head="Remarks">
        <Remarks remarks={sheet.remarks} />
      </td>
      <td className="py-3 align-middle" data-head="Waits on">
        {sheet.waitsOn === '' ? <Dash /> : sheet.waitsOn}
      </td>
    </tr>
  );
}

function Governing({ sheet }: { readonly sheet: RevisionSummary }) {
  if (sheet.governing === null) return <Dash />;
  const { utilisation, label } = sheet.governing;
  const standing = sheet.failed > 0 ? 'over' : standingOf(utilisation);
  return (
    <span className="whitespace-nowrap" title={label}>
      <span className="font-semibold">{formatUtilisation(utilisation)}</span> <StandingWord standing={standing} />
    </span>
  );
}

function Remarks({ remarks }: { readonly remarks: RevisionSummary['remarks'] }) {
  if (remarks.open === 0) return <Dash />;
  return (
    <span className="whitespace-nowrap">
      {count(remarks.open, 'open', 'open')}
      {remarks.mustFix > 0 && <span className="font-semibold text-madder"> · ◆ {remarks.mustFix} must fix</span>}
    </span>
  );
}

function Dash() {
  return (
    <span className="text-pencil" data-none>
      <span aria-hidden="true">–</span>
      <span className="sr-only">none</span>
    </span>
  );
}
