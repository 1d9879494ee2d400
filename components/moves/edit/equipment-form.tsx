"use client";

import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { ActionBar } from "@/components/ui/action-bar";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/text-field";
import { CallError } from "@/lib/entry/fetcher";
import { CATALOGUE, findRequirement } from "@/lib/moves/catalogue";
import { splitAliases } from "@/lib/moves/draft";
import { editEquipmentMutation, equipmentOptions, moveKeys } from "@/lib/moves/options";
import { AnswerGroups } from "../answer-groups";
import { useAttemptKey } from "../use-attempt-key";
import { fieldErrorOf, SaveState } from "./save-state";

/** The unit's answers to the requirement catalogue. Only what was touched here lies over what the case holds, so that two people can write one after the other. */
export function EquipmentForm({ moveId }: { moveId: string }) {
  const client = useQueryClient();
  const { data: kept } = useQuery(equipmentOptions(moveId));
  const [touched, setTouched] = useState<Record<string, string>>({});
  const [aliases, setAliases] = useState<string | null>(null);
  const [key, renewKey] = useAttemptKey();
  const save = useMutation({
    ...editEquipmentMutation(moveId),
    onSuccess: async (_saved, given) => {
      renewKey();
      await client.invalidateQueries({ queryKey: moveKeys.case(moveId) });
      await client.fetchQuery({ ...equipmentOptions(moveId), staleTime: 0 });
      // What was typed while it was being saved stays.
      setTouched((now) => Object.fromEntries(Object.entries(now).filter(([name, value]) => given.input.answers[name] !== value)));
      setAliases(null);
    },
    onError: async (error) => {
      renewKey();
      if (error instanceof CallError && error.status === 409) await client.fetchQuery({ ...equipmentOptions(moveId), staleTime: 0 });
    },
  });
  if (!kept) return null;
  const answers = { ...kept.answers, ...touched };
  const typedAliases = aliases ?? kept.aliases.join(", ");
  const errorOf = fieldErrorOf(save.error);
  const dirty = Object.keys(touched).length > 0 || aliases !== null;
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const known = Object.fromEntries(Object.entries(answers).filter(([name]) => findRequirement(name)));
    if (!save.isPending) save.mutate({ input: { answers: known, aliases: splitAliases(typedAliases), version: kept.version }, key });
  };
  return (
    <form noValidate onSubmit={submit} className="grid gap-4">
      <SaveState error={save.error} saved={save.isSuccess && !dirty} />
      <TextField name="aliases" label="Other marks and numbers it is known by" hint="Commas between them." className="max-w-120" autoComplete="off" value={typedAliases} onChange={(event) => setAliases(event.target.value)} error={errorOf("aliases") ?? errorOf("aliases.0")} />
      <AnswerGroups requirements={CATALOGUE} answers={answers} onAnswer={(name, value) => setTouched({ ...touched, [name]: value })} errorOf={errorOf} />
      <ActionBar>
        <Button type="submit" busy={save.isPending}>
          Save the unit
        </Button>
      </ActionBar>
    </form>
  );
}
