import { QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen } from "@testing-library/react";
import { FakeApi } from "@/__tests__/client/fakeApi";
import { queryClient } from "@/features/api/queryClient";
import { session } from "@/features/api/session";
import { SecondFactorCard } from "./SecondFactorCard";

const account = {
  id: "00000000-0000-4000-8000-000000000001",
  email: "maren@orlow.example",
  role: "singer",
  confirmed: true,
  secondFactor: false,
} as const;
const codes = ["k7mq2x-9fdw4h", "p3zt8r-c6vn2j"];
const wrong = (code: string, path: string) => ({
  status: 403,
  body: { code, message: `Not the right ${path}.`, fields: [{ path, message: `Not the right ${path}.` }] },
});
let api: FakeApi;
let answers: Record<string, ReturnType<FakeApi["intercept"]>>;

beforeEach(async () => {
  localStorage.clear();
  api = new FakeApi();
  answers = {
    "GET /account/second-factor": { status: 200, body: { on: false, recoveryCodesLeft: 0 } },
    "POST /account/second-factor": { status: 201, body: { qrSvg: "<svg/>", uri: "otpauth://x", secret: "ABCDEFGH" } },
    "GET /account": { status: 200, body: { ...account, secondFactor: true } },
  };
  api.intercept = (method, path) => answers[`${method} ${path}`];
  api.install();
  await session.settled();
});
afterEach(() => act(() => queryClient.clear()));

const type = (label: string, text: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value: text } });
const show = (card: React.ReactNode) => render(<QueryClientProvider client={queryClient}>{card}</QueryClientProvider>);

it("switches codes on: password, picture and secret, a first code, then the recovery codes once", async () => {
  show(<SecondFactorCard account={account} />);
  fireEvent.click(await screen.findByTestId("codes-on"));
  type("Password", "tide tables 1907");
  fireEvent.submit(screen.getByRole("form"));
  expect((await screen.findByTestId("secret")).textContent).toBe("ABCD EFGH");
  expect(screen.getByRole("img", { name: /QR picture/ }).getAttribute("src")).toBe("data:image/svg+xml,%3Csvg%2F%3E");
  answers["POST /account/second-factor/confirm"] = wrong("wrong-code", "code");
  type("Code of the app", "123456");
  fireEvent.submit(screen.getByRole("form"));
  expect(await screen.findByText("Not the right code.")).toBeTruthy();
  expect(screen.getByLabelText<HTMLInputElement>("Code of the app").value).toBe("123456");
  answers["POST /account/second-factor/confirm"] = { status: 200, body: { recoveryCodes: codes } };
  answers["GET /account/second-factor"] = { status: 200, body: { on: true, recoveryCodesLeft: 2 } };
  fireEvent.submit(screen.getByRole("form"));
  expect((await screen.findByTestId("recovery-codes")).textContent).toBe(codes.join(""));
  fireEvent.click(screen.getByTestId("codes-kept"));
  expect(await screen.findByText(/Recovery codes left: 2/)).toBeTruthy();
  expect(screen.queryByTestId("recovery-codes")).toBeNull();
});

it("does not offer codes before the address is confirmed", async () => {
  show(<SecondFactorCard account={{ ...account, confirmed: false }} />);
  expect((await screen.findByTestId("codes-on")).getAttribute("aria-disabled")).toBe("true");
  expect(screen.getByText(/Confirm your e-mail address first/)).toBeTruthy();
});
