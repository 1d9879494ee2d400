type Row = { manager: boolean; inspects: boolean; bills: boolean; dispatches: boolean; joinedAt: Date; admittedAt: Date | null; removedAt: Date | null };

const earlier = (one: Date | null, two: Date | null) => (one && two ? (one < two ? one : two) : (one ?? two));

/** One person's rows in two companies that become one: whatever either let them do, they may; who is present in either is present. */
export function mergedMember(kept: Row | undefined, gone: Row): Row {
  if (!kept || (kept.removedAt && !gone.removedAt)) return gone;
  if (gone.removedAt) return kept;
  return {
    manager: kept.manager || gone.manager, inspects: kept.inspects || gone.inspects, bills: kept.bills || gone.bills, dispatches: kept.dispatches || gone.dispatches,
    joinedAt: earlier(kept.joinedAt, gone.joinedAt) ?? kept.joinedAt, admittedAt: earlier(kept.admittedAt, gone.admittedAt), removedAt: null,
  };
}
