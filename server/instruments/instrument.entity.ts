import { Column, Entity } from "typeorm";
import type { OwnInstrument } from "../../shared/contract/instrument";
import { absentAsNull, OwnedEntity } from "../database/owned.entity";

@Entity("instruments")
export class InstrumentEntity extends OwnedEntity implements OwnInstrument {
  @Column({ type: "text", name: "preset_id", nullable: true })
  presetId!: string | null;

  @Column({ type: "text" })
  name!: string;

  @Column({ type: "jsonb" })
  strings!: OwnInstrument["strings"];

  @Column({ type: "double precision", name: "scale_mm" })
  scaleMm!: number;

  @Column({ type: "smallint" })
  frets!: number;

  @Column({ type: "jsonb", name: "fret_map", nullable: true, transformer: absentAsNull })
  fretMap?: number[];

  @Column({ type: "smallint", name: "capo_to" })
  capoTo!: number;

  @Column({ type: "boolean", name: "left_handed" })
  leftHanded!: boolean;

  @Column({ type: "boolean" })
  favourite!: boolean;

  @Column({ type: "text", nullable: true, transformer: absentAsNull })
  photo?: string;
}
