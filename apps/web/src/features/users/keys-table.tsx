import type { ApiKey } from "@beadroll/domain/schemas/user";
import { type ReactElement, useState } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { ConfirmDialog } from "../../kit/actions/confirm-dialog.tsx";
import { toast } from "../../kit/states/announcements.ts";
import { problemFrom } from "../../kit/states/problem-words.ts";
import { StateMark } from "../../kit/states/state-mark.tsx";
import type { Column } from "../../kit/tables/columns.ts";
import { DataTable } from "../../kit/tables/data-table.tsx";
import { InstantText } from "../../kit/units/instant-text.tsx";
import { useRevokeKey } from "./users.mutations.ts";

/** Machine keys, with the way to withdraw one. */
export function KeysTable(props: { keys: readonly ApiKey[] }): ReactElement {
  const [asked, setAsked] = useState<ApiKey | null>(null);
  const [error, setError] = useState<string | null>(null);
  const revoke = useRevokeKey();
  const columns: readonly Column<ApiKey>[] = [
    { id: "name", head: "For", value: (key) => key.name },
    { id: "prefix", head: "Begins", value: (key) => key.prefix, figures: true, width: "7rem" },
    { id: "scopes", head: "May", value: (key) => key.scopes.join(", "), wideOnly: true },
    {
      id: "made",
      head: "Made",
      cell: (key) => <InstantText at={key.created_at} />,
      value: (key) => key.created_at,
      width: "10rem",
      wideOnly: true,
    },
    {
      id: "state",
      head: "State",
      cell: (key) =>
        key.revoked_at === null ? (
          <Button
            onClick={() => {
              setError(null);
              setAsked(key);
            }}
          >
            Withdraw
          </Button>
        ) : (
          <StateMark tone="none" word="Withdrawn" />
        ),
      value: (key) => key.revoked_at,
      width: "9rem",
    },
  ];
  const confirm = () => {
    if (asked === null) return;
    revoke.mutate(asked.id, {
      onSuccess: () => {
        toast(`Key ${asked.name} withdrawn`, "attend");
        setAsked(null);
      },
      onError: (cause) => setError(problemFrom(cause).detail),
    });
  };
  return (
    <>
      <DataTable
        caption="Machine keys"
        rows={props.keys}
        columns={columns}
        rowKey={(key) => key.id}
        plain
        dense
        empty={<p className="px-[1.125rem] py-3 text-ash">No key yet.</p>}
      />
      <ConfirmDialog
        open={asked !== null}
        onClose={() => setAsked(null)}
        title={`Withdraw the key of ${asked?.name ?? ""}?`}
        action="Withdraw the key"
        kind="danger"
        busy={revoke.isPending}
        {...(error !== null && { error })}
        onConfirm={confirm}
      >
        <p>
          1 computer can no longer push or read from this moment. What it pushes is kept in its own queue. A
          withdrawn key cannot be given back.
        </p>
      </ConfirmDialog>
    </>
  );
}
