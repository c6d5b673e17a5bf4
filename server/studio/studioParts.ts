import type { DataSource } from "typeorm";
import { TryBucket } from "../http/tryBucket";
import { LinkTokensService } from "../mail/linkTokens.service";
import { AssignmentsService } from "./assignments/assignments.service";
import { CommentsService } from "./assignments/comments.service";
import { PartAccessService } from "./assignments/partAccess.service";
import { PartsService } from "./assignments/parts.service";
import { PupilsCopyService } from "./assignments/pupilsCopy.service";
import { ConsentService } from "./consent/consent.service";
import { GuardiansService } from "./consent/guardians.service";
import { GroupsService } from "./groups/groups.service";
import { InvitesService } from "./invites/invites.service";
import { MembersService } from "./members.service";
import { RosterService } from "./roster/roster.service";
import { StudioAccessService } from "./studioAccess.service";
import { StudiosService } from "./studios.service";

const hourS = 3600;
const dayS = 24 * hourS;

/** What the routes of studios work with. */
export type StudioParts = ReturnType<typeof studioParts>;

export function studioParts(dataSource: DataSource, { tokenSecret }: { tokenSecret: string }) {
  const tokens = new LinkTokensService(tokenSecret);
  const access = new StudioAccessService(dataSource);
  const guardians = new GuardiansService(dataSource, tokens);
  const consent = new ConsentService(dataSource, guardians);
  const copies = new PupilsCopyService(dataSource);
  const partAccess = new PartAccessService(dataSource);
  const comments = new CommentsService(dataSource, partAccess);
  return {
    ...{ access, guardians, consent, comments },
    studios: new StudiosService(dataSource, access),
    members: new MembersService(dataSource, access),
    groups: new GroupsService(dataSource, access),
    invites: new InvitesService(dataSource, access, tokens, consent),
    roster: new RosterService(dataSource, access),
    assignments: new AssignmentsService(dataSource, access, copies),
    parts: new PartsService(dataSource, partAccess, copies, comments),
    limits: {
      /** links from mails, by address: a whole school may have the same, and nobody guesses 256 bits */
      link: new TryBucket(dataSource, "studio-link", 1000),
      /** addresses written to, by teacher */
      invited: new TryBucket(dataSource, "invited", 400, dayS),
      /** mails to guardians, by pupil */
      guardian: new TryBucket(dataSource, "guardian", 5, dayS),
    },
  };
}
