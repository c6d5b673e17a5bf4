import { Column, Entity, PrimaryColumn } from "typeorm";

@Entity("studio_group_members")
export class StudioGroupMemberEntity {
  @PrimaryColumn({ type: "uuid", name: "group_id" })
  groupId!: string;

  @PrimaryColumn({ type: "uuid", name: "member_id" })
  memberId!: string;

  @Column({ type: "uuid", name: "studio_id" })
  studioId!: string;
}
