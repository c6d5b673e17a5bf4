import type { MemberConsent } from "../../../shared/contract/studio/consent";
import { memberShares, memberWaitsForGuardian } from "./digitalConsent";

/** Columns of a row `m` of studio_members and its account `u` from which `consentOf` reads. */
export const consentColumns = `m.consent_given_at AS "givenAt", m.consent_withdrawn_at AS "withdrawnAt",
  ${memberWaitsForGuardian} AS "waitsForGuardian", ${memberShares} AS shares`;

/**
 * How long recordings of a member `m` of a studio `s` are kept: what stood there when they agreed, or less where the
 * studio says less since. More holds only for those who agree to it anew.
 */
export const keptDaysColumn = `least(s.recordings_kept_days, m.recordings_kept_days) AS "recordingsKeptDays"`;

export interface ConsentRow {
  givenAt: Date | null;
  withdrawnAt: Date | null;
  waitsForGuardian: boolean;
  shares: boolean;
}

export function consentOf({ givenAt, withdrawnAt, waitsForGuardian, shares }: ConsentRow): MemberConsent {
  return {
    givenAt: givenAt?.toISOString() ?? null,
    withdrawnAt: withdrawnAt?.toISOString() ?? null,
    waitsForGuardian,
    shares,
  };
}

/** Reads what belongs to the row of a database's answer that spells it flat. */
export function splitConsent<Row extends ConsentRow>(row: Row) {
  const { givenAt: _given, withdrawnAt: _withdrawn, waitsForGuardian: _waits, shares: _shares, ...rest } = row;
  return { ...rest, consent: consentOf(row) };
}
