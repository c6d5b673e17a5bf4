import { act, fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { Button } from "@/features/ui/Button";
import { Chip } from "@/features/ui/Chip";
import { Choice } from "@/features/ui/Choice";
import { Field } from "@/features/ui/Field";
import { colors } from "@/features/ui/theme";
import { Form } from "@/features/ui/Form";
import { IconButton } from "@/features/ui/IconButton";
import { LiveText } from "@/features/ui/LiveText";
import { QueryState, type QueryLike } from "@/features/ui/QueryState";
import { Segmented } from "@/features/ui/Segmented";
import { layoutFor } from "@/features/ui/useLayout";
import { radioTarget } from "@/features/ui/useRadioKeys";

const options = [
  { value: "a", label: "Box guitar", hint: "A D F♯" },
  { value: "b", label: "Ukulele" },
  { value: "c", label: "Banjo" },
] as const;

function Chooser({ as: Group }: { as: "choice" | "segmented" }) {
  const [value, setValue] = useState<"a" | "b" | "c">("a");
  const props = { label: "Instrument", options, value, onChange: setValue };
  return Group === "choice" ? <Choice {...props} /> : <Segmented {...props} />;
}

describe("Button", () => {
  it("is a real button, said by its label", () => {
    const onPress = jest.fn();
    render(<Button label="Keep this voice" onPress={onPress} />);
    const button = screen.getByRole("button", { name: "Keep this voice" });
    expect(button.tagName).toBe("BUTTON");
    fireEvent.click(button);
    expect(onPress).toHaveBeenCalledTimes(1);
  });

  it("does nothing while it is off or busy, and says that it is busy", () => {
    const onPress = jest.fn();
    render(
      <>
        <Button label="Off" disabled onPress={onPress} />
        <Button label="Keeping" busy onPress={onPress} />
      </>,
    );
    for (const button of screen.getAllByRole("button")) fireEvent.click(button);
    expect(onPress).not.toHaveBeenCalled();
    expect(screen.getByRole("button", { name: "Keeping" }).getAttribute("aria-busy")).toBe("true");
  });

  it("has a name where it shows only a sign", () => {
    render(<IconButton icon="close" label="Close" onPress={() => undefined} />);
    expect(screen.getByRole("button", { name: "Close" })).toBeTruthy();
  });
});

describe("Chip", () => {
  it("is a button that stays in when chosen, and plain words without anything to do", () => {
    render(
      <>
        <Chip label="Capo 3" selected onPress={() => undefined} />
        <Chip label="Am" mono />
      </>,
    );
    expect(screen.getByRole("button").getAttribute("aria-pressed")).toBe("true");
    expect(screen.getAllByRole("button")).toHaveLength(1);
  });
});

describe.each(["choice", "segmented"] as const)("a radio group (%s)", (as) => {
  it("is one stop for Tab, and arrows choose", () => {
    render(<Chooser as={as} />);
    expect(screen.getByRole("radiogroup", { name: "Instrument" })).toBeTruthy();
    const radios = screen.getAllByRole("radio");
    expect(radios.map((radio) => radio.tabIndex)).toEqual([0, -1, -1]);
    act(() => radios[0]?.focus());
    fireEvent.keyDown(radios[0] as HTMLElement, { key: "ArrowDown" });
    expect(radios[1]?.getAttribute("aria-checked")).toBe("true");
    expect(document.activeElement).toBe(radios[1]);
    fireEvent.keyDown(radios[1] as HTMLElement, { key: "End" });
    expect(radios[2]?.getAttribute("aria-checked")).toBe("true");
  });
});

it.each([
  ["ArrowRight", 2, 0],
  ["ArrowLeft", 0, 2],
  ["Home", 2, 0],
  ["End", 0, 2],
  ["x", 1, null],
])("%s leads from radio button %i of three to %s", (key, index, target) => {
  expect(radioTarget(key, index, 3)).toBe(target);
});

describe("Field", () => {
  it("belongs to its label and takes what is typed", () => {
    const onChangeText = jest.fn();
    render(<Field label="Song title" value="" onChangeText={onChangeText} />);
    fireEvent.change(screen.getByLabelText("Song title"), { target: { value: "Lantern" } });
    expect(onChangeText).toHaveBeenCalledWith("Lantern");
  });

  it("shows an example softer than what is typed, so that an empty field is not taken for a full one", () => {
    render(<Field label="Note" value="" placeholder="G3" onChangeText={() => undefined} />);
    const { style } = screen.getByLabelText("Note");
    expect(style.getPropertyValue("--placeholderTextColor")).toBe(colors.inkSoft);
  });

  it("says what is wrong, tied to the field", () => {
    render(<Field label="Highest note" value="X4" error="There is no X4. Try A4." onChangeText={() => undefined} />);
    const field = screen.getByLabelText("Highest note");
    expect(field.getAttribute("aria-invalid")).toBe("true");
    expect(document.getElementById(field.getAttribute("aria-describedby") ?? "")?.textContent).toContain(
      "There is no X4. Try A4.",
    );
  });
});

describe("Form", () => {
  it("is a real form that its button sends", () => {
    const onSubmit = jest.fn();
    render(
      <Form label="Sign in" onSubmit={onSubmit}>
        <Button submit label="Sign in" onPress={() => undefined} />
      </Form>,
    );
    expect(screen.getByRole("form", { name: "Sign in" })).toBeTruthy();
    fireEvent.click(screen.getByRole("button"));
    expect(onSubmit).toHaveBeenCalledTimes(1);
  });
});

describe("LiveText", () => {
  it("waits for a pause, or speaks at once where it is urgent", () => {
    render(
      <>
        <LiveText>Listening</LiveText>
        <LiveText urgent>The microphone was taken away</LiveText>
      </>,
    );
    expect(screen.getByRole("status").getAttribute("aria-live")).toBe("polite");
    expect(screen.getByRole("alert").getAttribute("aria-live")).toBe("assertive");
  });
});

describe("QueryState", () => {
  const query = (over: Partial<QueryLike<string>>): QueryLike<string> => ({
    data: undefined,
    isPending: true,
    error: null,
    refetch: () => undefined,
    ...over,
  });

  it("shows that it is loading, then what came", () => {
    const { rerender } = render(<QueryState query={query({})}>{(data) => <p>{data}</p>}</QueryState>);
    expect(screen.getByRole("status").textContent).toBe("Loading");
    rerender(<QueryState query={query({ data: "Ferry", isPending: false })}>{(data) => <p>{data}</p>}</QueryState>);
    expect(screen.getByText("Ferry")).toBeTruthy();
  });

  it("offers another try after a failure", () => {
    const refetch = jest.fn();
    render(
      <QueryState query={query({ isPending: false, error: new Error("The shelf did not open."), refetch })}>
        {() => null}
      </QueryState>,
    );
    expect(screen.getByRole("alert").textContent).toContain("The shelf did not open.");
    fireEvent.click(screen.getByRole("button", { name: "Try again" }));
    expect(refetch).toHaveBeenCalledTimes(1);
  });

  it("keeps what was there when a newer copy fails", () => {
    render(<QueryState query={query({ data: "Ferry", error: new Error("no") })}>{(data) => <p>{data}</p>}</QueryState>);
    expect(screen.getByText("Ferry")).toBeTruthy();
  });
});

it.each([
  [320, "phone"],
  [599, "phone"],
  [600, "middle"],
  [1023, "middle"],
  [1024, "wide"],
  [1440, "wide"],
])("lays a window of %i px out as %s", (width, layout) => {
  expect(layoutFor(width)).toBe(layout);
});
