import { useEffect, useRef, useState, type ReactNode } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import type { IconName } from "@/features/ui/Icon";

interface UnfoldingCardProps {
  title: string;
  /** how things stand, or what happened last */
  children: ReactNode;
  openLabel: string;
  /** how one gives it up, such as "Not now" */
  closeLabel: string;
  icon?: IconName;
  /** the button that opens is a quiet one */
  quiet?: boolean;
  /** shown in place of the button; `fold` closes it once it is sent */
  form: (fold: () => void) => ReactNode;
  testID: string;
}

/** A card with a form that opens on wish, so that a page of several stays short. The focus goes in with it, and back. */
export function UnfoldingCard({
  title,
  children,
  openLabel,
  closeLabel,
  icon,
  quiet = false,
  form,
  testID,
}: UnfoldingCardProps) {
  const [open, setOpen] = useState(false);
  const foot = useRef<HTMLDivElement>(null);
  const before = useRef(open);
  useEffect(() => {
    if (before.current !== open) foot.current?.querySelector<HTMLElement>(open ? "input" : "button")?.focus();
    before.current = open;
  }, [open]);
  const fold = () => setOpen(false);
  const start = { alignSelf: "flex-start", marginLeft: open || quiet ? -8 : 0 } as const;
  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>{title}</Heading>
      {children}
      <div ref={foot} style={{ display: "flex", flexDirection: "column" }}>
        {open && form(fold)}
        <View style={start}>
          {open ? (
            <Button kind="text" small label={closeLabel} onPress={fold} testID={`${testID}-not-now`} />
          ) : (
            <Button
              kind={quiet ? "text" : "secondary"}
              small
              {...(icon === undefined ? null : { icon })}
              label={openLabel}
              onPress={() => setOpen(true)}
              testID={testID}
            />
          )}
        </View>
      </div>
    </Card>
  );
}
