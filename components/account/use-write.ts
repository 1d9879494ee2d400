"use client";

import { useMutation, type UseMutationOptions } from "@tanstack/react-query";
import { useIntent } from "@/components/ui/intent";
import { faultsOf } from "@/lib/entry/fetcher";

type Options<B, T> = UseMutationOptions<T, Error, { key: string; body: B }>;

/** One kind of write of a screen: sends under the key of its intent, and keeps what was refused for the fields to show. */
export function useWrite<B, T>(options: Options<B, T>) {
  const mutation = useMutation(options);
  const intent = useIntent();
  const send = (body: B, done?: (answer: T) => void) =>
    mutation.mutate({ key: intent.key(body), body }, {
      onSuccess: (answer) => {
        intent.done();
        done?.(answer);
      },
    });
  return { send, faults: faultsOf(mutation.error), busy: mutation.isPending, done: mutation.isSuccess, forget: mutation.reset };
}
