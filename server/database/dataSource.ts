import "reflect-metadata";
import { DataSource, type DataSourceOptions } from "typeorm";
import { ArrangementEntity } from "../arrangements/arrangement.entity";
import { UserEntity } from "../auth/user.entity";
import { InstrumentEntity } from "../instruments/instrument.entity";
import { DecisionEntity } from "../keys/decision.entity";
import { TryEntity } from "../keys/try.entity";
import { SheetLinkEntity } from "../sheets/sheetLink.entity";
import { LineUpEntity } from "../lineUps/lineUp.entity";
import { SongEntity } from "../songs/song.entity";
import { AssignmentEntity } from "../studio/assignments/assignment.entity";
import { AssignmentPartEntity } from "../studio/assignments/assignmentPart.entity";
import { CommentEntity } from "../studio/assignments/comment.entity";
import { GuardianEntity } from "../studio/consent/guardian.entity";
import { StudioGroupEntity } from "../studio/groups/studioGroup.entity";
import { StudioGroupMemberEntity } from "../studio/groups/studioGroupMember.entity";
import { StudioInviteEntity } from "../studio/invites/studioInvite.entity";
import { HandInEntity } from "../studio/handIns/handIn.entity";
import { StudioEntity } from "../studio/studio.entity";
import { StudioMemberEntity } from "../studio/studioMember.entity";
import { TakeEntity } from "../voices/take.entity";
import { VoiceEntity } from "../voices/voice.entity";
import { PlayerWishesEntity } from "../ways/playerWishes.entity";
import { Arrangements1784000000000 } from "./migrations/Arrangements1784000000000";
import { Accounts1782100000000 } from "./migrations/Accounts1782100000000";
import { ConsentKept1796310000000 } from "./migrations/ConsentKept1796310000000";
import { FirstTables1764547200000 } from "./migrations/FirstTables1764547200000";
import { HandIns1796200000000 } from "./migrations/HandIns1796200000000";
import { MembersGone1796300000000 } from "./migrations/MembersGone1796300000000";
import { TakeOfHandIn1796500000000 } from "./migrations/TakeOfHandIn1796500000000";
import { TakesGone1796400000000 } from "./migrations/TakesGone1796400000000";
import { InstrumentPhotos1778000000000 } from "./migrations/InstrumentPhotos1778000000000";
import { KeysPerVoice1775001600000 } from "./migrations/KeysPerVoice1775001600000";
import { KindOfTake1767225600000 } from "./migrations/KindOfTake1767225600000";
import { LineUps1785000000000 } from "./migrations/LineUps1785000000000";
import { MailAndJobs1782000000000 } from "./migrations/MailAndJobs1782000000000";
import { PlayerWishes1779000000000 } from "./migrations/PlayerWishes1779000000000";
import { SheetLinks1780000000000 } from "./migrations/SheetLinks1780000000000";
import { SongRevisions1769904000000 } from "./migrations/SongRevisions1769904000000";
import { SongVersions1772323200000 } from "./migrations/SongVersions1772323200000";
import { Studios1796100000000 } from "./migrations/Studios1796100000000";

const common: Pick<
  Extract<DataSourceOptions, { type: "postgres" }>,
  "type" | "entities" | "synchronize" | "uuidExtension" | "installExtensions" | "invalidWhereValuesBehavior"
> = {
  type: "postgres",
  entities: [
    UserEntity,
    VoiceEntity,
    TakeEntity,
    SongEntity,
    DecisionEntity,
    TryEntity,
    InstrumentEntity,
    PlayerWishesEntity,
    SheetLinkEntity,
    LineUpEntity,
    ArrangementEntity,
    StudioEntity,
    StudioMemberEntity,
    StudioGroupEntity,
    StudioGroupMemberEntity,
    StudioInviteEntity,
    GuardianEntity,
    AssignmentEntity,
    AssignmentPartEntity,
    CommentEntity,
    HandInEntity,
  ],
  synchronize: false,
  uuidExtension: "pgcrypto",
  installExtensions: false,
  // A condition that vanishes because its value is missing would show one person another's rows.
  invalidWhereValuesBehavior: { null: "throw", undefined: "throw" },
};

/** The pool that serves requests. `onIdleError` hears of connections lost while idle, which else would end the process. */
export function createDataSource(url: string, onIdleError: (error: Error) => void): DataSource {
  return new DataSource({
    ...common,
    url,
    poolSize: 10,
    connectTimeoutMS: 3000,
    poolErrorHandler: onIdleError,
    extra: {
      keepAlive: true,
      statement_timeout: 5000,
      query_timeout: 6000,
      idle_in_transaction_session_timeout: 10_000,
    },
  });
}

/** One connection without time limits, for migrations. */
export function createMigrationSource(url: string): DataSource {
  return new DataSource({
    ...common,
    url,
    poolSize: 1,
    connectTimeoutMS: 3000,
    poolErrorHandler: () => undefined,
    migrations: [
      FirstTables1764547200000,
      KindOfTake1767225600000,
      SongRevisions1769904000000,
      SongVersions1772323200000,
      KeysPerVoice1775001600000,
      InstrumentPhotos1778000000000,
      PlayerWishes1779000000000,
      SheetLinks1780000000000,
      MailAndJobs1782000000000,
      Accounts1782100000000,
      Arrangements1784000000000,
      LineUps1785000000000,
      Studios1796100000000,
      HandIns1796200000000,
      MembersGone1796300000000,
      ConsentKept1796310000000,
      TakesGone1796400000000,
      TakeOfHandIn1796500000000,
    ],
    migrationsTransactionMode: "all",
  });
}
