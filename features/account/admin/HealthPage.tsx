import { useQuery } from "@tanstack/react-query";
import { QueryState } from "@/features/ui/QueryState";
import { adminQueries } from "./adminQueries";
import { Records } from "./Records";

const due = (oldestDueS: number) =>
  oldestDueS < 1 ? "none is late" : `the oldest is due for ${Math.round(oldestDueS)} s`;

/** How queue, mail and storage are. */
export function HealthPage() {
  const query = useQuery(adminQueries.health());
  return (
    <QueryState query={query} title="The health could not be asked">
      {({ queue, mail, storage }) => (
        <Records
          caption="Health of the parts"
          columns={["Part", "State"]}
          rows={[
            [
              "Queue",
              `${queue.waiting} waiting, ${queue.retrying} tried again, ${queue.failed} given up; ${due(queue.oldestDueS)}`,
            ],
            [
              "Mail, seven days",
              `${mail.sent} sent, ${mail.sending} on their way, ${mail.uncertain} uncertain, ${mail.refused} refused`,
            ],
            ...storage.map(({ name, up }) => [`Storage: ${name}`, up ? "answers" : "does not answer"]),
          ]}
          keyOf={([part = ""]) => part}
          cellsOf={(cells) => cells}
        />
      )}
    </QueryState>
  );
}
