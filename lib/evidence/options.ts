import { queryOptions } from "@tanstack/react-query";
import { call, read } from "@/lib/entry/fetcher";
import { routes } from "@/lib/routes";
import type { AnnouncePhoto } from "./input";
import type { Announced, MovePhoto } from "./types";

export const photoKeys = { all: ["photos"] as const, ofMove: (moveId: string) => [...photoKeys.all, moveId] as const };

/** All photos of a move. */
export const photosOptions = (moveId: string) =>
  queryOptions({ queryKey: photoKeys.ofMove(moveId), queryFn: ({ signal }) => read<MovePhoto[]>(routes.api.photos(moveId), signal), staleTime: 10_000 });

/** Announces a photo, or asks again what the server has of it. */
export const announcePhoto = ({ moveId, ...rest }: AnnouncePhoto) => call<Announced>(routes.api.photos(moveId), rest);
