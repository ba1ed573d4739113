import { render, screen, waitFor } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { beforeAll, expect, test, vi } from "vitest";
import { AddPersonForm } from "@/components/people/add-person-form";
import { PersonRow } from "@/components/people/person-row";
import { RolesTable } from "@/components/people/roles-table";
import type { ActionState } from "@/lib/domain/action-state";
import { readFormData } from "@/lib/domain/form-data";
import { isAllowed, PERMISSIONS, ROLE_NAMES, ROLES } from "@/lib/domain/permissions/permissions";
import type { PersonView } from "@/lib/domain/views";

/** jsdom knows the element but not how to open it. */
beforeAll(() => {
  HTMLDialogElement.prototype.showModal = function () {
    this.open = true;
  };
  HTMLDialogElement.prototype.close = function () {
    this.open = false;
  };
});

const roles = ROLES.map((role) => ({ value: role, label: ROLE_NAMES[role], detail: "" }));
const answer = (state: ActionState) => vi.fn(async (_state: ActionState, _form: FormData) => state);
const done = () => answer({ status: "done", message: "Added.", data: null });

const PERSON: PersonView = {
  id: "person1",
  name: "Ada Fell",
  email: "ada@example.org",
  role: "participant",
  version: 2,
  state: "expired",
  isSelf: false,
  answer: null,
};

test("a wrong address is said at its field and the name stays", async () => {
  const action = answer({
    status: "refused",
    formError: "Look at the marked fields.",
    fieldErrors: { email: ["That is not an e-mail address."] },
  });
  render(<AddPersonForm action={action} tripId="trip1" roles={roles} />);
  await userEvent.type(screen.getByLabelText("Name"), "Ada Fell");
  await userEvent.type(screen.getByLabelText("E-mail address"), "ada at home");
  await userEvent.click(screen.getByRole("radio", { name: "Co-leader" }));
  await userEvent.click(screen.getByRole("button", { name: "Add and invite" }));
  expect(await screen.findByText("That is not an e-mail address.")).toBeInTheDocument();
  expect(screen.getByLabelText("Name")).toHaveValue("Ada Fell");
  const form = action.mock.lastCall?.[1] ?? new FormData();
  expect(readFormData(form)).toEqual({ tripId: "trip1", name: "Ada Fell", email: "ada at home", role: "co-leader" });
});

test("after one was added the form is empty for the next", async () => {
  render(<AddPersonForm action={done()} tripId="trip1" roles={roles} />);
  await userEvent.type(screen.getByLabelText("Name"), "Ada Fell");
  await userEvent.click(screen.getByRole("button", { name: "Add and invite" }));
  expect(await screen.findByText("Added.")).toBeInTheDocument();
  await waitFor(() => expect(screen.getByLabelText("Name")).toHaveValue(""));
});

test("who may only look sees no action", () => {
  render(<PersonRow tripId="trip1" person={PERSON} roleName="Participant" roles={roles} actions={null} />);
  expect(screen.getByText("invitation has expired")).toBeInTheDocument();
  expect(screen.queryByRole("button")).not.toBeInTheDocument();
});

test("removing somebody says first what depends on it, and needs a second yes", async () => {
  const remove = answer({
    status: "refused",
    formError: "Ada Fell is in use. 2 nights have a place for them.",
    fieldErrors: { confirmed: ["Ada Fell is in use. 2 nights have a place for them."] },
  });
  const actions = { update: done(), invite: done(), remove };
  render(<PersonRow tripId="trip1" person={PERSON} roleName="Participant" roles={roles} actions={actions} />);
  await userEvent.click(screen.getByRole("button", { name: "Remove Ada Fell" }));
  await userEvent.click(screen.getByRole("button", { name: "Remove" }));
  expect(await screen.findByRole("alert")).toHaveTextContent("2 nights have a place for them");
  expect(readFormData(remove.mock.calls[0]?.[1] ?? new FormData())).toMatchObject({ confirmed: false });
  await userEvent.click(screen.getByRole("button", { name: "Remove all of it" }));
  expect(readFormData(remove.mock.calls[1]?.[1] ?? new FormData())).toMatchObject({
    confirmed: true,
    personId: "person1",
  });
});

test("the table of roles shows what the permission table says", () => {
  render(
    <RolesTable roles={ROLES.map((role) => ({ role, name: ROLE_NAMES[role] }))} rows={Object.values(PERMISSIONS)} />,
  );
  const row = screen.getByRole("row", { name: /send cards and lists by e-mail/ });
  const cells = ROLES.map((role) => (isAllowed(role, "post.send") ? "yes" : "no"));
  expect(row).toHaveTextContent(cells.map((word) => (word === "yes" ? "yes" : "–no")).join(""));
});
