import { mutationOptions, queryOptions } from "@tanstack/react-query";
import { call, read } from "@/lib/entry/fetcher";
import { routes } from "@/lib/routes";
import type { PeopleView } from "./types";
import type { InvitedPart } from "./vocabulary";

export const partyKeys = { ofMove: (moveId: string) => ["people", moveId] as const };

export const peopleOptions = (moveId: string) =>
  queryOptions({ queryKey: partyKeys.ofMove(moveId), queryFn: ({ signal }) => read<PeopleView>(routes.api.people(moveId), signal), refetchInterval: 15_000 });

export type InviteBody = {
  part: InvitedPart; legId: string; companyId: string; companyName: string; email: string; name: string;
  inspects: boolean; bills: boolean; dispatches: boolean;
};
type Send<B> = { key: string; body: B };

/** A write on the parties of a move. Who sits where also stands in the head of the case, which is kept under ["moves", "case", id]. */
const onParties = <B, T = unknown>(moveId: string, path: (body: B) => string, method: "POST" | "DELETE", sent: (body: B) => unknown = () => ({})) =>
  mutationOptions({
    mutationFn: ({ key, body }: Send<B>) => call<T>(path(body), sent(body), key, method),
    onSettled: (_data, _error, _sent, _result, { client }) =>
      Promise.all([client.invalidateQueries({ queryKey: partyKeys.ofMove(moveId) }), client.invalidateQueries({ queryKey: ["moves", "case", moveId] })]),
  });

export const invitePartyMutation = (moveId: string) => onParties<InviteBody, { invitationId: string | null }>(moveId, () => routes.api.invitations(moveId), "POST", (body) => body);
export const sendAgainMutation = (moveId: string) => onParties<{ invitationId: string }>(moveId, ({ invitationId }) => routes.api.invitationAgain(moveId, invitationId), "POST");
export const revokeMutation = (moveId: string) => onParties<{ invitationId: string }>(moveId, ({ invitationId }) => routes.api.invitation(moveId, invitationId), "DELETE");
export const removePartyMutation = (moveId: string) => onParties<{ seatId: string }>(moveId, ({ seatId }) => routes.api.party(moveId, seatId), "DELETE");
export const makeFollowLinkMutation = (moveId: string) => onParties<{ label: string; email: string }, { followId: string; url: string }>(moveId, () => routes.api.followLinks(moveId), "POST", (body) => body);
export const endFollowLinkMutation = (moveId: string) => onParties<{ followId: string }>(moveId, ({ followId }) => routes.api.followLink(moveId, followId), "DELETE");
