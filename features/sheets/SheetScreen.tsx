import type { Href } from "expo-router";
import { useMemo, useState, type ReactNode } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import type { Crumb } from "@/features/ui/ScreenHead";
import { Segmented } from "@/features/ui/Segmented";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import type { Sheet } from "@/shared/sheets/sheet";
import { sheetPages } from "@/shared/sheets/sheetPages";
import { ForPrinter } from "./paper/ForPrinter";
import { PaperPage } from "./paper/PaperPage";
import { SheetChoices, type SheetChoicesProps } from "./SheetChoices";
import { useSheetHabits } from "./sheetHabits";
import { SheetReading } from "./SheetReading";
import { useSheetPdf } from "./useSheetPdf";

export interface SheetScreenProps {
  sheet: Sheet;
  /** of the page; the paper says the song's own */
  title: string;
  subtitle: string;
  crumb?: Crumb;
  /** the ways are being searched: grids and capo come in a moment */
  searching: boolean;
  stage: Href;
  choices: Omit<SheetChoicesProps, "options" | "onChange">;
  /** where the walk stands that explains how it is played */
  why?: Href | undefined;
  /** how the sheet is shared, or until when it is */
  share: ReactNode;
}

/** A song's sheet: the pages as they will be printed, what stands on them, and the ways to paper, stage and others. */
export function SheetScreen({
  sheet,
  title,
  subtitle,
  crumb,
  searching,
  stage,
  choices,
  why,
  share,
}: SheetScreenProps) {
  const layout = useLayout();
  const [options, change] = useSheetHabits();
  const [onPaper, setOnPaper] = useState(false);
  const pages = useMemo(() => sheetPages(sheet, options), [sheet, options]);
  const pdf = useSheetPdf();
  const phone = layout === "phone";
  const paper = (
    <View style={{ gap: 20 }} testID="paper">
      {pages.map((page) => (
        <View key={page.number} style={{ borderWidth: 1, borderColor: colors.line }}>
          <PaperPage page={page} />
        </View>
      ))}
    </View>
  );
  const outputs = (
    <>
      <LinkButton
        href={stage}
        label="Stage view"
        icon="play"
        kind={phone ? "primary" : "secondary"}
        small={!phone}
        testID="to-stage"
        style={phone ? { flexGrow: 1 } : null}
      />
      <Button
        kind="secondary"
        small={!phone}
        label="PDF"
        accessibleName="PDF of this sheet"
        icon="file"
        busy={pdf.isPending}
        onPress={() => pdf.mutate({ sheet, options })}
        testID="sheet-pdf"
      />
      <Button
        kind={phone ? "secondary" : "primary"}
        small={!phone}
        label="Print"
        onPress={() => window.print()}
        testID="sheet-print"
      />
    </>
  );
  const beside = (
    <View style={{ gap: 20 }}>
      <SheetChoices {...choices} options={options} onChange={change} />
      <Text variant="small" tone="soft" testID="page-count">
        {pages.length === 1 ? `One page on ${options.paper}.` : `${pages.length} pages on ${options.paper}.`}
      </Text>
      {why !== undefined && (
        <TextLink href={why} testID="sheet-to-why">
          Why this works, step by step
        </TextLink>
      )}
      <Card style={{ gap: 12 }}>
        <Heading level={2} size={16}>
          Share it
        </Heading>
        {share}
      </Card>
    </View>
  );
  const state = (
    <>
      {pdf.error && (
        <Notice kind="error" title="The PDF could not be made">
          {`${pdf.error.message} The sheet is still here, and printing needs no connection.`}
        </Notice>
      )}
      {searching && <Skeleton bars={[{ width: "60%" }]} words="Looking for ways to play it" />}
    </>
  );
  return (
    <Screen
      title={title}
      subtitle={subtitle}
      {...(crumb ? { crumb } : null)}
      wide
      {...(phone ? { footer: <View style={{ flexDirection: "row", gap: 8 }}>{outputs}</View> } : { actions: outputs })}
    >
      <ForPrinter pages={pages} paper={options.paper} />
      {phone ? (
        <View style={{ gap: 16 }}>
          <Segmented
            label="How the sheet is shown"
            value={onPaper ? "paper" : "read"}
            options={[
              { value: "read", label: "To read" },
              { value: "paper", label: "On paper" },
            ]}
            onChange={(shown) => setOnPaper(shown === "paper")}
            testID="sheet-view"
          />
          {state}
          {onPaper ? paper : <SheetReading sheet={sheet} options={options} />}
          <View style={{ borderTopWidth: 1, borderColor: colors.line, paddingTop: 16 }}>{beside}</View>
        </View>
      ) : (
        <View
          style={webStyle({
            display: "grid",
            gridTemplateColumns: layout === "wide" ? "minmax(0, 794px) minmax(260px, 340px)" : "minmax(0, 1fr) 250px",
            columnGap: 32,
            alignItems: "start",
          })}
        >
          <View style={{ gap: 12 }}>
            {state}
            {paper}
          </View>
          {beside}
        </View>
      )}
    </Screen>
  );
}
