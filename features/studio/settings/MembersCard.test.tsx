import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor } from "@testing-library/react";
import { Answers } from "@/__tests__/client/answers";
import { aPupil, aStudio, studioId } from "@/__tests__/client/studioPeople";
import { queryClient } from "@/features/api/queryClient";
import { ThemeProvider } from "@/features/ui/ThemeProvider";
import { MembersCard } from "./MembersCard";

const colleague = aPupil(2, "Hob Carrow", null, { role: "co-teacher" });
const path = `PUT /studios/${studioId}/members/${colleague.memberId}`;
let server: Answers;

beforeAll(() => {
  Element.prototype.scrollIntoView = () => undefined;
});

beforeEach(async () => {
  queryClient.clear();
  server = new Answers().to(`GET /studios/${studioId}/roster`, [colleague]).to(path, aStudio());
  server.install();
  render(
    <QueryClientProvider client={queryClient}>
      <ThemeProvider>
        <MembersCard studio={aStudio()} />
      </ThemeProvider>
    </QueryClientProvider>,
  );
  await screen.findByTestId(`role-${colleague.memberId}`);
});

const roleField = () => screen.getByTestId<HTMLSelectElement>(`role-${colleague.memberId}`);
const choose = (role: string) => fireEvent.change(roleField(), { target: { value: role } });

it.each([
  ["owner", "Pass the studio on to Hob Carrow?"],
  ["pupil", "Make Hob Carrow a pupil?"],
])("asks before somebody becomes %s, and changes nothing until then", async (role, question) => {
  choose(role);
  expect(screen.getByRole("group", { name: question })).toBeTruthy();
  fireEvent.click(screen.getByRole("button", { name: "Leave it" }));
  expect(roleField().value).toBe("co-teacher");
  expect(document.activeElement).toBe(roleField());
  expect(server.bodiesOf(path)).toEqual([]);
  choose(role);
  fireEvent.click(screen.getByTestId("remove-confirmed"));
  await waitFor(() => expect(server.bodiesOf(path)).toEqual([{ role }]));
  await waitFor(() => expect(screen.queryByTestId("remove-asked")).toBeNull());
});

it("says of a teacher who is taken out what stays, and not that takes are deleted", () => {
  fireEvent.click(screen.getByTestId(`remove-${colleague.memberId}`));
  expect(screen.getByTestId("remove-asked").textContent).toMatch(/What they gave and wrote stays/);
});
