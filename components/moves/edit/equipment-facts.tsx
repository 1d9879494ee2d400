"use client";

import { useQuery } from "@tanstack/react-query";
import { answerText, CATALOGUE } from "@/lib/moves/catalogue";
import { equipmentOptions } from "@/lib/moves/options";
import { REQUIREMENT_GROUP_LABELS, REQUIREMENT_GROUPS } from "@/lib/moves/requirements/types";

/** The unit's answers for somebody who only reads them; what nobody answered is said at the end of each group. */
export function EquipmentFacts({ moveId }: { moveId: string }) {
  const { data: kept } = useQuery(equipmentOptions(moveId));
  if (!kept) return null;
  return (
    <div className="grid gap-6">
      {kept.aliases.length > 0 && <p className="text-14">Also known as {kept.aliases.join(", ")}.</p>}
      {REQUIREMENT_GROUPS.map((group) => {
        const asked = CATALOGUE.filter((one) => one.group === group);
        const answered = asked.filter(({ key }) => (kept.answers[key] ?? "") !== "");
        return (
          <section key={group}>
            <h3 className="mb-1 text-17 font-[680]">{REQUIREMENT_GROUP_LABELS[group]}</h3>
            <dl className="border-t border-rule">
              {answered.map(({ key, question }) => (
                <div key={key} className="grid gap-x-6 border-b border-rule py-2 text-14 sm:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
                  <dt className="text-ink-2">{question}</dt>
                  <dd className="font-[560]">{answerText(key, kept.answers[key] ?? "")}</dd>
                </div>
              ))}
            </dl>
            {answered.length < asked.length && <p className="mt-1 text-14 text-ink-2">{asked.length - answered.length} not answered yet; owner or contractor fill them in.</p>}
          </section>
        );
      })}
    </div>
  );
}
