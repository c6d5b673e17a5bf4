import type { Scale } from "@/features/span/ladderGeometry";
import type { Way } from "@/shared/ways/way";
import type { PartDraft, PupilPart } from "./pupilParts";

/** What a place of the table needs of one pupil. */
export interface PartCellProps {
  part: PupilPart;
  ways: readonly Way[] | null | undefined;
  onDraft: (memberId: string, draft: Partial<PartDraft>) => void;
}

export interface AssignTableProps {
  parts: readonly PupilPart[];
  ways: ReadonlyMap<string, readonly Way[] | null | undefined>;
  onDraft: PartCellProps["onDraft"];
  /** the key is the same for all and nobody is left out: only ways are changed */
  oneKey?: boolean;
}

export interface AssignRowsProps extends AssignTableProps {
  scale: Scale;
}

export interface CellsProps extends PartCellProps {
  oneKey: boolean;
  scale: Scale;
  width: number;
}
