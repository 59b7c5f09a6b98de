import type { Mark, Remark, RevisionDetail } from '../../../schemas/api.ts';

/** What a change will make of a revision, shown before the server has answered. Each can be undone by its opposite. */
export function withMark(detail: RevisionDetail, mark: Mark): RevisionDetail {
  const others = detail.marks.filter((other) => !isSame(other, mark));
  return withMarks(detail, [...others, mark]);
}

export function withoutMark(detail: RevisionDetail, mark: Pick<Mark, 'path' | 'person'>): RevisionDetail {
  return withMarks(
    detail,
    detail.marks.filter((other) => !isSame(other, mark)),
  );
}

export function withRemark(detail: RevisionDetail, remark: Remark): RevisionDetail {
  const others = detail.remarks.filter((other) => other.id !== remark.id);
  return withRemarks(detail, [...others, remark]);
}

export function withoutRemark(detail: RevisionDetail, id: string): RevisionDetail {
  return withRemarks(
    detail,
    detail.remarks.filter((remark) => remark.id !== id),
  );
}

function isSame(a: Pick<Mark, 'path' | 'person'>, b: Pick<Mark, 'path' | 'person'>): boolean {
  return a.path === b.path && a.person.id === b.person.id;
}

function withMarks(detail: RevisionDetail, marks: readonly Mark[]): RevisionDetail {
  const before = new Set(detail.marks.map((mark) => mark.path)).size;
  const after = new Set(marks.map((mark) => mark.path)).size;
  const counted = { ...detail.summary.marks, marked: detail.summary.marks.marked + after - before };
  return { ...detail, marks, summary: { ...detail.summary, marks: counted } };
}

function withRemarks(detail: RevisionDetail, remarks: readonly Remark[]): RevisionDetail {
  const open = remarks.filter((remark) => remark.state !== 'resolved');
  const mustFix = open.filter((remark) => remark.weight === 'must fix').length;
  return { ...detail, remarks, summary: { ...detail.summary, remarks: { open: open.length, mustFix } } };
}
