import type { Comment, Part } from "@/shared/contract/studio/assignment";

/** A place in a take. */
export interface TakeTime {
  handInId: string;
  atS: number;
}

/** What the takes of a part need from the page around them. */
export interface TakesPlace {
  part: Part;
  /** those that stand at a time in a take are shown there */
  comments: readonly Comment[];
  /** a time was chosen, to write something there; null: let go */
  onTime: (time: TakeTime | null) => void;
}
