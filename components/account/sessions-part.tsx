"use client";

import { Sheet } from "@/components/ui/sheet";
import { State } from "@/components/ui/state";
import { Table, Td, Th } from "@/components/ui/table";
import { endOtherSessionsMutation, endSessionMutation } from "@/lib/account/options";
import type { SessionView } from "@/lib/account/types";
import { formatFullWhen } from "@/lib/moves/when";
import { ConfirmButton } from "./confirm-button";
import { useWrite } from "./use-write";

/** Where the person is signed in, and the means to end each of it. */
export function SessionsPart({ sessions }: { sessions: SessionView[] }) {
  const end = useWrite(endSessionMutation());
  const endOthers = useWrite(endOtherSessionsMutation());
  const others = sessions.filter((one) => !one.current).length;
  const all = (
    <ConfirmButton opener="End all others" title="End all other sessions?" confirm="End them" body={{}} write={endOthers} variant="ghost">
      <p>Whoever is signed in there has to sign in again. This device stays signed in.</p>
    </ConfirmButton>
  );
  return (
    <Sheet title="Where you are signed in" lead="A session ends by itself a week after its last use. Last use is kept to a quarter of an hour." actions={others > 0 ? all : null}>
      <Table caption="Sessions" stack>
        <thead>
          <tr><Th>Device</Th><Th>Signed in</Th><Th>Last used</Th><Th><span className="sr-only">End it</span></Th></tr>
        </thead>
        <tbody>
          {sessions.map(({ sessionId, device, startedAt, lastUsedAt, current }) => (
            <tr key={sessionId}>
              <Td label="Device"><b>{device}</b></Td>
              <Td label="Signed in" mono>{formatFullWhen(startedAt, "UTC")}</Td>
              <Td label="Last used" mono>{formatFullWhen(lastUsedAt, "UTC")}</Td>
              <Td>
                {current ? <State tone="slate">This one</State> : (
                  <ConfirmButton opener="End" of={device} title={`End the session of ${device}?`} confirm="End it" body={{ sessionId }} write={end}>
                    <p>Whoever is signed in there has to sign in again.</p>
                  </ConfirmButton>
                )}
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </Sheet>
  );
}
