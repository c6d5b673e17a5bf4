import type { Role } from "../../shared/contract/account";

/** Who may ask for an operation, and on what. The one place where this is written down; what is not here does not start. */
export interface Permission {
  /** "visitor": everybody; "person": whoever is signed in; otherwise only these roles */
  who: "visitor" | "person" | readonly Role[];
  /** needs an address that is shown to be one's own; for all that reaches other people */
  confirmed?: true;
  /**
   * What the ids in the path may name. "none": there is no id. "own": only what is in the asker's reach; another's is
   * answered as if it did not exist. "own-or-new": the same, and an unknown id makes a new one. "any": everybody's.
   * "link": what the secret in the path opens, for whoever holds it.
   */
  object: "none" | "own" | "own-or-new" | "any" | "link";
}

const visitor = { who: "visitor", object: "none" } as const;
const oneself = { who: "person", object: "none" } as const;
const own = { who: "person", object: "own" } as const;
const admin = { who: ["admin"], object: "none" } as const;
const adminOnAny = { who: ["admin"], object: "any" } as const;

/** The five routes of a collection of one's own. */
const collection = (name: string) => ({
  [`get${name}`]: oneself,
  [`get${name}Id`]: own,
  [`put${name}Id`]: { who: "person", object: "own-or-new" } as const,
  [`delete${name}Id`]: own,
});

/** The operations of studios: who is in one, and as what, decides further within it (StudioAccessService). */
const studio = {
  getStudios: oneself,
  postStudios: oneself,
  getStudiosId: own,
  putStudiosId: own,
  deleteStudiosId: own,
  putStudiosIdMembersMemberId: own,
  deleteStudiosIdMembersMemberId: own,
  getStudiosIdRoster: own,
  getStudiosIdRosterCsv: own,
  getStudiosIdGroups: own,
  postStudiosIdGroups: own,
  putStudiosIdGroupsGroupId: own,
  deleteStudiosIdGroupsGroupId: own,
  putStudiosIdGroupsGroupIdKey: own,
  getStudiosIdInvites: own,
  // Mails go to strangers.
  postStudiosIdInvites: { ...own, confirmed: true },
  postStudiosIdInvitesInviteIdResend: { ...own, confirmed: true },
  deleteStudiosIdInvitesInviteId: own,
  postInvitesLook: visitor,
  postInvitesAccept: oneself,
  putStudiosIdConsent: own,
  getGuardian: oneself,
  postGuardian: { ...oneself, confirmed: true },
  postGuardianLook: visitor,
  postGuardianConfirm: visitor,
  postGuardianWithdraw: visitor,
  getStudiosIdAssignments: own,
  postStudiosIdAssignments: own,
  getStudiosIdAssignmentsAssignmentId: own,
  putStudiosIdAssignmentsAssignmentId: own,
  deleteStudiosIdAssignmentsAssignmentId: own,
  getParts: oneself,
  getPartsId: own,
  putPartsId: own,
  getPartsIdComments: own,
  postPartsIdComments: own,
  deletePartsIdCommentsCommentId: own,
} as const;

/** By operation id, as in the API's description. */
export const permissions: Readonly<Record<string, Permission>> = {
  postAuthSignUp: visitor,
  postAuthSignIn: visitor,
  postAuthSecondStep: visitor,
  postAuthRefresh: visitor,
  postAuthSignOut: visitor,
  postAuthForgotten: visitor,
  postAuthReset: visitor,
  getAccount: oneself,
  getAccountPerson: oneself,
  putAccountPerson: oneself,
  postAccountEmail: oneself,
  postAccountEmailResend: oneself,
  postAccountEmailConfirm: oneself,
  postAccountPassword: oneself,
  getAccountSessions: oneself,
  deleteAccountSessions: oneself,
  deleteAccountSessionsId: own,
  getAccountSecondFactor: oneself,
  // Whoever claims a stranger's address must not lock its owner out with codes.
  postAccountSecondFactor: { ...oneself, confirmed: true },
  postAccountSecondFactorConfirm: oneself,
  postAccountSecondFactorOff: oneself,
  postAccountSecondFactorRecoveryCodes: oneself,
  postAccountErasure: oneself,
  getAccountExport: oneself,
  getMailPreferences: oneself,
  putMailPreferences: oneself,
  postMailUnsubscribe: visitor,
  getMailUnsubscribe: visitor,
  ...collection("Voices"),
  ...collection("Takes"),
  ...collection("Songs"),
  getSongsPage: oneself,
  getSongsTags: oneself,
  getSongsIdVersions: own,
  getSongsIdVersionsVersionId: own,
  ...collection("Decisions"),
  ...collection("Tries"),
  ...collection("Instruments"),
  ...collection("Wishes"),
  ...collection("Arrangements"),
  ...collection("LineUps"),
  postChartsPdf: visitor,
  postSheetsPdf: visitor,
  getSheetLinks: oneself,
  postSheetLinks: oneself,
  deleteSheetLinksId: own,
  getSharedToken: { who: "visitor", object: "link" },
  // What of a studio is whose, its services say: PartAccessService. Whoever has nothing to do with it gets a 404.
  postPartsIdHandIns: own,
  getPartsIdHandIns: own,
  getHandInsId: own,
  getHandInsIdSound: own,
  deleteHandInsId: own,
  headUploadsId: own,
  patchUploadsId: own,
  ...studio,
  getAdminUsers: admin,
  putAdminUsersIdSuspension: adminOnAny,
  putAdminUsersIdRole: adminOnAny,
  getAdminHealth: admin,
  getAdminAudit: admin,
  getHealth: visitor,
  getOpenapiJson: visitor,
  getDocs: visitor,
};
