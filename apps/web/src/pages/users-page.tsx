import type { User } from "@beadroll/domain/schemas/user";
import { useSuspenseQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { useMay } from "../app/session.ts";
import { KeyForm } from "../features/users/key-form.tsx";
import { KeysTable } from "../features/users/keys-table.tsx";
import { UserForm } from "../features/users/user-form.tsx";
import { userQueries } from "../features/users/users.queries.ts";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet, SheetGrid, SheetStack } from "../kit/page/sheet.tsx";
import { EmptyState } from "../kit/states/empty-state.tsx";
import { PagePart } from "../kit/states/fault-boundary.tsx";
import type { Column } from "../kit/tables/columns.ts";
import { DataTable } from "../kit/tables/data-table.tsx";

const COLUMNS: readonly Column<User>[] = [
  { id: "login", head: "Sign-in name", value: (user) => user.login, figures: true, width: "11rem" },
  { id: "name", head: "Name", value: (user) => user.name },
  { id: "roles", head: "Roles", value: (user) => user.roles.join(", ") },
];

function UsersAndKeys(): ReactElement {
  const users = useSuspenseQuery(userQueries.users());
  const keys = useSuspenseQuery(userQueries.keys());
  const cells = useSuspenseQuery(userQueries.cells());
  return (
    <SheetGrid>
      <SheetStack>
        <Sheet title="Accounts" flush>
          <DataTable
            caption="Accounts"
            rows={users.data.items}
            columns={COLUMNS}
            rowKey={(user) => user.id}
            plain
            dense
          />
        </Sheet>
        <Sheet title="Keys of machines" flush>
          <KeysTable keys={keys.data.items} />
        </Sheet>
      </SheetStack>
      <SheetStack>
        <Sheet title="Make a key">
          <KeyForm cells={cells.data.items} />
        </Sheet>
        <Sheet title="Make an account">
          <UserForm />
        </Sheet>
      </SheetStack>
    </SheetGrid>
  );
}

/** Accounts of people and keys of machines: for administrators. */
export default function UsersPage(): ReactElement {
  const may = useMay("users:manage");
  return (
    <>
      <PageHead title="Users and keys" facts="People sign in with an account; computers carry a key" />
      {may ? (
        <PagePart label="Accounts and keys" rows={8}>
          <UsersAndKeys />
        </PagePart>
      ) : (
        <EmptyState title="For administrators">
          Ask an administrator for an account, a role or a key.
        </EmptyState>
      )}
    </>
  );
}
