import { mutationOptions, queryOptions, keepPreviousData } from "@tanstack/react-query";
import { call, read } from "@/lib/entry/fetcher";
import { routes } from "@/lib/routes";
import { filterQuery, type MoveFilter } from "./list-filter";
import type { CaseFile, Draft, Equipment, MovePage, SavedDraft } from "./types";

const REFRESH_MS = 15_000;

/** Every other room invalidates `moveKeys.case(moveId)` after a write, so that the head of the case follows. */
export const moveKeys = {
  all: ["moves"] as const,
  lists: () => [...moveKeys.all, "list"] as const,
  list: (filter: MoveFilter) => [...moveKeys.lists(), filterQuery(filter)] as const,
  case: (moveId: string) => [...moveKeys.all, "case", moveId] as const,
  /** Not under the case: somebody may be typing over it, so it is read anew only when its own form says so. */
  equipment: (moveId: string) => [...moveKeys.all, "equipment", moveId] as const,
  draft: (draftId: string) => ["drafts", draftId] as const,
};

/** One page of moves; read again while it is looked at. */
export const movesOptions = (filter: MoveFilter) =>
  queryOptions({
    queryKey: moveKeys.list(filter),
    queryFn: ({ signal }) => read<MovePage>(`${routes.api.moves()}${filterQuery(filter)}`, signal),
    refetchInterval: REFRESH_MS,
    staleTime: 5_000,
    placeholderData: keepPreviousData,
  });

/** The case file: head, route, conditions, whose turn it is. */
export const caseOptions = (moveId: string) =>
  queryOptions({
    queryKey: moveKeys.case(moveId),
    queryFn: ({ signal }) => read<CaseFile>(routes.api.move(moveId), signal),
    refetchInterval: REFRESH_MS,
    staleTime: 5_000,
  });

/** The unit's answers to the catalogue. */
export const equipmentOptions = (moveId: string) =>
  queryOptions({
    queryKey: moveKeys.equipment(moveId),
    queryFn: ({ signal }) => read<Equipment>(routes.api.equipment(moveId), signal),
    staleTime: Infinity,
    refetchOnWindowFocus: false,
  });

/** A draft as kept, read when saving found that it had changed. */
export const readDraft = (draftId: string) => read<Draft>(routes.api.draft(draftId));

/** Keeps a new draft. The same key again gives the same draft. */
export const beginDraft = (companyId: string, body: unknown, key: string) => call<SavedDraft>(routes.api.drafts(), { companyId, body }, key);

export const saveDraft = (draftId: string, companyId: string, body: unknown, version: number) =>
  call<SavedDraft>(routes.api.draft(draftId), { companyId, body, version }, undefined, "PUT");

export const discardDraft = (draftId: string, key: string) => call<{ draftId: string }>(routes.api.draft(draftId), {}, key, "DELETE");

export type Opening = { draftId: string | null; input: Record<string, unknown>; key: string };

/** Opens a move from a draft, or without one. */
export const openMoveMutation = () =>
  mutationOptions({
    mutationFn: ({ draftId, input, key }: Opening) => call<{ moveId: string; caseNumber: string }>(draftId ? routes.api.openDraft(draftId) : routes.api.moves(), input, key),
  });

/** One write on a case; afterwards everything of it is read anew. */
const onCase = <Input, Answer>(moveId: string, run: (input: Input, key: string) => Promise<Answer>) =>
  mutationOptions<Answer, Error, { input: Input; key: string }>({
    mutationFn: ({ input, key }) => run(input, key),
    onSuccess: (_answer, _given, _result, { client }) => client.invalidateQueries({ queryKey: moveKeys.case(moveId) }),
  });

export type EquipmentChange = { answers: Record<string, string>; aliases: string[]; version: number };

export const editEquipmentMutation = (moveId: string) => onCase(moveId, (input: EquipmentChange, key) => call<{ version: number }>(routes.api.equipment(moveId), input, key, "PUT"));

export const editLegMutation = (moveId: string, legId: string) => onCase(moveId, (input: Record<string, unknown>, key) => call<{ version: number }>(routes.api.leg(moveId, legId), input, key, "PUT"));

export const editMoveMutation = (moveId: string) => onCase(moveId, (input: Record<string, unknown>, key) => call<{ version: number }>(routes.api.move(moveId), input, key, "PUT"));

export const cancelMoveMutation = (moveId: string) => onCase(moveId, (input: { reason: string }, key) => call<{ moveId: string }>(routes.api.cancelMove(moveId), input, key));
