import { useEffect, useRef, type ReactNode } from "react";
import { View } from "react-native";
import { Heading } from "./Heading";
import { IconButton } from "./IconButton";
import { colors, sizes } from "./theme";
import { useLayout } from "./useLayout";

export interface DialogProps {
  title: string;
  onClose: () => void;
  children: ReactNode;
  testID?: string;
}

/** A sheet over the page: at the foot of the phone, in the middle of wider screens. Escape and a press beside it close it. */
export function Dialog({ title, onClose, children, testID }: DialogProps) {
  const node = useRef<HTMLDialogElement>(null);
  const phone = useLayout() === "phone";
  useEffect(() => {
    const dialog = node.current;
    const opener = document.activeElement;
    dialog?.showModal();
    return () => {
      dialog?.close();
      if (opener instanceof HTMLElement && opener.isConnected) opener.focus();
    };
  }, []);
  return (
    <dialog
      ref={node}
      aria-label={title}
      data-testid={testID}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClick={(event) => {
        if (event.target === node.current) onClose();
      }}
      style={{
        boxSizing: "border-box",
        width: "100%",
        maxWidth: phone ? "100%" : 480,
        maxHeight: "86dvh",
        margin: phone ? "auto 0 0" : "auto",
        padding: 0,
        border: `1px solid ${colors.line}`,
        borderRadius: phone ? `${sizes.radius}px ${sizes.radius}px 0 0` : sizes.radius,
        background: colors.card,
        color: colors.ink,
        ["--ground" as string]: "var(--card)",
      }}
    >
      <View style={{ padding: 16, paddingTop: 8, gap: 8 }}>
        <View style={{ flexDirection: "row", alignItems: "center", justifyContent: "space-between", gap: 8 }}>
          <Heading level={2} style={{ flexShrink: 1 }}>
            {title}
          </Heading>
          <IconButton icon="close" label="Close" onPress={onClose} testID="close-dialog" />
        </View>
        {children}
      </View>
    </dialog>
  );
}
