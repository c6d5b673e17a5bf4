import { useQueryClient } from "@tanstack/react-query";
import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LinkButton } from "@/features/ui/LinkButton";
import { LiveText } from "@/features/ui/LiveText";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { colors, sizes } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import { refreshShelf } from "../songQueries";
import { ImportResults } from "./ImportResults";
import { importable } from "./incoming";
import { importFiles, type ImportProgress } from "./importRun";
import { WhatIsRead } from "./WhatIsRead";

const besides = webStyle({
  display: "grid",
  gridTemplateColumns: "minmax(0, 1fr) minmax(300px, 392px)",
  columnGap: 40,
  alignItems: "start",
});

/** Brings many files at once onto the shelf. */
export function ImportScreen() {
  const client = useQueryClient();
  const layout = useLayout();
  const wide = layout === "wide";
  const input = useRef<HTMLInputElement>(null);
  const running = useRef<AbortController | null>(null);
  const [progress, setProgress] = useState<ImportProgress | null>(null);
  useEffect(() => () => running.current?.abort(), []);
  const working = progress?.status === "reading" || progress?.status === "keeping";

  const take = async (files: readonly File[]) => {
    if (files.length === 0 || (running.current && !running.current.signal.aborted && working)) return;
    const stop = new AbortController();
    running.current = stop;
    await importFiles(files, stop.signal, setProgress);
    await refreshShelf(client);
  };
  return (
    <Screen
      title="Import songs"
      crumb={{ label: "Songs", href: "/songs" }}
      wide={wide}
      footer={
        working ? (
          <Button kind="secondary" label="Cancel" onPress={() => running.current?.abort()} testID="import-cancel" />
        ) : progress ? (
          <LinkButton label="To your songs" href="/songs" testID="import-done" />
        ) : undefined
      }
    >
      <View style={wide ? besides : { gap: 24 }}>
        <View style={{ gap: 20 }}>
          <input
            ref={input}
            type="file"
            multiple
            accept={importable}
            aria-label="Files with songs"
            data-testid="import-files"
            tabIndex={-1}
            style={{ position: "absolute", width: 1, height: 1, opacity: 0, pointerEvents: "none" }}
            onChange={(event) => {
              const files = [...(event.target.files ?? [])];
              event.target.value = "";
              void take(files);
            }}
          />
          <DropPlace onFiles={(files) => void take(files)} disabled={working}>
            <Text variant="body">
              {layout !== "phone"
                ? "Drop files here, or choose them: as many as you like at once."
                : "Choose as many files as you like at once."}
            </Text>
            <Text variant="small" tone="soft">
              They are read on this device.
            </Text>
            <Button
              label={progress && !working ? "Choose more files" : "Choose files"}
              kind={progress ? "secondary" : "primary"}
              icon="file"
              disabled={working}
              onPress={() => input.current?.click()}
              testID="import-choose"
              style={{ alignSelf: "flex-start" }}
            />
          </DropPlace>
          {progress && working && <ProgressBar progress={progress} />}
          <LiveText variant="strong" testID="import-words">
            {progress ? progressWords(progress) : ""}
          </LiveText>
          {progress && progress.results.length > 0 && <ImportResults results={progress.results} done={!working} />}
        </View>
        {(wide || !progress) && <WhatIsRead />}
      </View>
    </Screen>
  );
}

function progressWords({ status, done, total, results }: ImportProgress): string {
  if (status === "reading") return `Reading file ${Math.min(done + 1, total)} of ${total}.`;
  if (status === "keeping") return `Keeping song ${done + 1} of ${total}.`;
  if (status === "cancelled") return "Cancelled. Nothing was imported.";
  const count = (outcome: string) => results.filter((each) => each.outcome === outcome).length;
  const songs = (number: number) => `${number} ${number === 1 ? "song" : "songs"}`;
  const parts = [
    `${songs(count("imported"))} imported.`,
    count("known") > 0 ? `${songs(count("known"))} you have already.` : "",
    count("refused") > 0 ? `${count("refused")} could not be read.` : "",
  ];
  return parts.filter((part) => part !== "").join(" ");
}

function ProgressBar({ progress: { status, done, total, at } }: { progress: ImportProgress }) {
  const share = total === 0 ? 0 : (done / total) * 100;
  return (
    <View style={{ gap: 6 }}>
      <div
        role="progressbar"
        aria-label={status === "reading" ? "Files read" : "Songs kept"}
        aria-valuemin={0}
        aria-valuemax={total}
        aria-valuenow={done}
        style={{ height: 10, borderRadius: 5, background: colors.line, overflow: "hidden" }}
      >
        <div style={{ width: `${share}%`, height: "100%", background: colors.lagoon }} />
      </div>
      <Text variant="small" tone="soft" numberOfLines={1}>
        {at}
      </Text>
    </View>
  );
}

/** A frame that takes files dropped on it. */
function DropPlace({
  onFiles,
  disabled,
  children,
}: {
  onFiles: (files: File[]) => void;
  disabled: boolean;
  children: React.ReactNode;
}) {
  const [over, setOver] = useState(false);
  return (
    <div
      data-testid="import-drop"
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={(event) => {
        event.preventDefault();
        setOver(false);
        if (!disabled) onFiles([...event.dataTransfer.files]);
      }}
      style={{
        display: "flex",
        flexDirection: "column",
        gap: 12,
        padding: 20,
        borderRadius: sizes.radius,
        border: `1.5px dashed ${over ? colors.plum : colors.inkSoft}`,
        background: over ? "var(--soft)" : colors.card,
      }}
    >
      {children}
    </div>
  );
}
