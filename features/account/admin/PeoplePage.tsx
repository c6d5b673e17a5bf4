import { useInfiniteQuery, useMutation, useQueryClient } from "@tanstack/react-query";
import { useRef, useState } from "react";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { useSession } from "@/features/api/SessionProvider";
import { Button } from "@/features/ui/Button";
import { Field } from "@/features/ui/Field";
import { Form } from "@/features/ui/Form";
import { LiveText } from "@/features/ui/LiveText";
import { QueryState } from "@/features/ui/QueryState";
import { Question } from "@/features/ui/Question";
import { Select } from "@/features/ui/Select";
import type { Role } from "@/shared/contract/account";
import type { AdminUser } from "@/shared/contract/admin";
import { momentInWords } from "../momentInWords";
import { adminQueries } from "./adminQueries";
import { changeWords, type AdminChange } from "./changeWords";
import { Records } from "./Records";
import { ShowMore } from "./ShowMore";

const roles: { value: Role; label: string }[] = [
  { value: "singer", label: "Singer" },
  { value: "teacher", label: "Teacher" },
  { value: "admin", label: "Administrator" },
];

function standing(user: AdminUser): string {
  const words = [
    user.suspended && "suspended",
    user.confirmed ? "confirmed" : "not confirmed",
    user.secondFactor && "codes on",
    user.eraseAt !== null && `erased on ${momentInWords(user.eraseAt)}`,
  ];
  return words.filter(Boolean).join(", ");
}

/** People with an account: found by their address, suspended and let in again, given a role. */
export function PeoplePage() {
  const client = useQueryClient();
  const me = useSession().account?.id;
  const [typed, setTyped] = useState("");
  const [q, setQ] = useState("");
  const query = useInfiniteQuery(adminQueries.users(q));
  /** chosen, and asked about before it happens: an arrow key in a list of roles is no decision */
  const [wanted, setWanted] = useState<AdminChange | null>(null);
  /** what was pressed, to go back to */
  const pressed = useRef<Element | null>(null);
  const leave = () => {
    setWanted(null);
    if (pressed.current instanceof HTMLElement) pressed.current.focus();
  };
  const change = useMutation({
    mutationFn: ({ user: { id }, what, body }: AdminChange) => http.put<AdminUser>(`/admin/users/${id}/${what}`, body),
    onSuccess: () => {
      leave();
      return client.invalidateQueries({ queryKey: ["admin"] });
    },
  });
  const ask = (next: AdminChange) => {
    pressed.current = document.activeElement;
    change.reset();
    setWanted(next);
  };
  return (
    <View style={{ gap: 16 }}>
      <Form label="Look for people" onSubmit={() => setQ(typed.trim())}>
        <View style={{ maxWidth: 480, gap: 8 }}>
          <Field label="Part of an e-mail address" value={typed} onChangeText={setTyped} testID="people-search" />
          <View style={{ alignSelf: "flex-start" }}>
            <Button submit small kind="secondary" icon="search" label="Look" onPress={() => undefined} />
          </View>
        </View>
      </Form>
      {wanted && (
        <Question
          key={`${wanted.user.id} ${wanted.what}`}
          {...changeWords(wanted)}
          failed="Nothing was changed."
          keepLabel="Leave it"
          onConfirm={() => change.mutate(wanted)}
          onKeep={leave}
          busy={change.isPending}
          error={change.error}
        />
      )}
      <QueryState query={query} title="The people could not be listed">
        {({ pages }) => (
          <>
            <LiveText variant="small" tone="soft">
              {pages.flat().length === 0 ? "Nobody has such an address." : `${pages.flat().length} shown`}
            </LiveText>
            <Records
              caption="People with an account"
              columns={["Address", "Role", "Standing", "Last seen", "Entry"]}
              rows={pages.flat()}
              keyOf={({ id }) => id}
              cellsOf={(user) => [
                user.email,
                user.id === me ? (
                  "Administrator, you"
                ) : (
                  <Select
                    key="role"
                    inline
                    label={`Role of ${user.email}`}
                    options={roles}
                    value={user.role}
                    onChange={(role) => ask({ user, what: "role", body: { role } })}
                  />
                ),
                standing(user),
                user.lastSeenAt === null ? "never" : momentInWords(user.lastSeenAt),
                user.id === me ? (
                  "open"
                ) : (
                  <Button
                    key="suspend"
                    kind="text"
                    small
                    label={user.suspended ? "Let in again" : "Suspend"}
                    accessibleName={`${user.suspended ? "Let in again" : "Suspend"}: ${user.email}`}
                    busy={change.isPending && change.variables.user.id === user.id}
                    onPress={() => ask({ user, what: "suspension", body: { suspended: !user.suspended } })}
                  />
                ),
              ]}
            />
            <ShowMore query={query} />
          </>
        )}
      </QueryState>
    </View>
  );
}
