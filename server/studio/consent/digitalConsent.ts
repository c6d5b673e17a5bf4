/**
 * From which age a person agrees alone to what an online service does with their data: 16, unless the country says less
 * (Regulation (EU) 2016/679, Art. 8 (1)). The ages of the EU's countries are those of Commission Staff Working Document
 * SWD(2020) 115 final, p. 17; those marked "from memory" are later changes or countries that it does not list.
 */
const agesByCountry: Readonly<Record<string, number>> = {
  ...{ BE: 13, EE: 13, FI: 13, LV: 13, MT: 13, PT: 13, SE: 13 },
  ...{ AT: 14, BG: 14, CY: 14, ES: 14, IT: 14, LT: 14 },
  ...{ CZ: 15, FR: 15, GR: 15 },
  // From memory: Denmark, 13 in that document, 15 since 2024; Iceland and Norway; the United Kingdom, Data Protection Act 2018, s. 9.
  ...{ DK: 15, IS: 13, NO: 13, GB: 13 },
};
const otherwise = 16;

export const ageOfDigitalConsent = (country: string | null) => agesByCountry[country ?? ""] ?? otherwise;

/** The same table for the database, so that a question there needs no second one here. */
const ageSql = (users: string) => {
  const cases = Object.entries(agesByCountry).map(([country, age]) => `WHEN '${country}' THEN ${age}`);
  return `CASE ${users}.country ${cases.join(" ")} ELSE ${otherwise} END`;
};

/**
 * Must a guardian agree? NULL while the birth year is unknown. Of a birthday only the year is known, so whoever may
 * still have it before them this year counts as the younger.
 */
const needsGuardianSql = (users: string) =>
  `(extract(year FROM now() AT TIME ZONE 'UTC')::int - ${users}.birth_year - 1 < ${ageSql(users)})`;

/** Agreed, not taken back, and old enough or with a guardian's word for this studio: teachers may see and hear. */
const sharesSql = (members: string, users: string) =>
  `(${members}.left_at IS NULL AND ${members}.consent_given_at IS NOT NULL AND ${members}.consent_withdrawn_at IS NULL
    AND coalesce(NOT ${needsGuardianSql(users)} OR ${members}.guardian_agreed_at IS NOT NULL, false))`;

const waitsSql = (members: string, users: string) =>
  `(${members}.left_at IS NULL AND ${members}.consent_given_at IS NOT NULL AND ${members}.consent_withdrawn_at IS NULL
    AND coalesce(${needsGuardianSql(users)}, false) AND ${members}.guardian_agreed_at IS NULL)`;

/** Conditions on a row `m` of studio_members and its account `u`. */
export const memberShares = sharesSql("m", "u");
export const memberWaitsForGuardian = waitsSql("m", "u");
export const personNeedsGuardian = needsGuardianSql("u");
/** The same for what somebody `told` wants to tell. */
export const toldNeedsGuardian = needsGuardianSql("told");
export const toldShares = sharesSql("m", "told");
