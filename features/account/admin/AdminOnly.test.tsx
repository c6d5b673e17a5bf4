import { act, screen } from "@testing-library/react";
import { setAccountStage, show } from "@/__tests__/client/accountStage";
import { session } from "@/features/api/session";
import { AdminOnly } from "./AdminOnly";

jest.mock("expo-router", () => ({
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
}));
setAccountStage({ signedIn: true });

const open = () =>
  show(
    <AdminOnly here="people">
      <p>The people</p>
    </AdminOnly>,
  );

it("tells anybody else that nothing stands here for them", () => {
  open();
  expect(screen.getByTestId("not-yours")).toBeTruthy();
  expect(screen.queryByText("The people")).toBeNull();
});

it("asks administrators for codes first", () => {
  session.accountChanged({ ...session.current().account!, role: "admin" });
  open();
  expect(screen.getByTestId("codes-first")).toBeTruthy();
  expect(screen.queryByText("The people")).toBeNull();
});

it("lets administrators with codes in, and leads to the other pages", () => {
  session.accountChanged({ ...session.current().account!, role: "admin", secondFactor: true });
  open();
  expect(screen.getByText("The people")).toBeTruthy();
  expect(screen.getAllByRole("link").map((link) => link.getAttribute("href"))).toEqual([
    "/admin/health",
    "/admin/audit",
  ]);
  act(() => session.accountChanged({ ...session.current().account!, role: "singer" }));
  expect(screen.queryByText("The people")).toBeNull();
});
