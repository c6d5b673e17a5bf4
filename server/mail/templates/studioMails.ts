import { type Mail, setMail } from "./mailLayout";

export interface InviteData {
  teacher: string;
  studio: string;
}

/** To whoever is to join a studio; they may not have an account yet. */
export function inviteMail({ teacher, studio }: InviteData, link: string): Mail {
  return setMail({
    subject: `${teacher} invites you to ${studio}`,
    says: [
      `${teacher} would like you to join the studio "${studio}" at Larkspan. There you get songs in your own key, and may hand in what you sang.`,
      "Before you accept, you see what your teacher will see of you. The link is good once, for seven days.",
    ],
    action: { label: "Look at the invitation", link },
    foot: ["If you do not know who this is, do nothing: nothing happens without the link."],
  });
}

export interface GuardianData {
  pupil: string;
  studio: string;
  teacher: string;
}

/** To the parent or guardian of a pupil under the age of digital consent. */
export function guardianMail({ pupil, studio, teacher }: GuardianData, link: string): Mail {
  return setMail({
    subject: `${pupil} needs your word`,
    says: [
      `${pupil} would like to join the studio "${studio}" of ${teacher} at Larkspan and gave your address as that of a parent or guardian.`,
      "Until you agree, nothing is shared with the teacher and no recording reaches the server. The page behind the link says what the teacher would see and hear, and how long recordings are kept. You can take your word back at any time.",
      "The link is good for 14 days.",
    ],
    action: { label: "Read it and decide", link },
    foot: ["If you are not a parent or guardian, do nothing: without you it stays as it is."],
  });
}

export interface GuardianKeptData {
  pupil: string;
  studio: string;
}

/** To a guardian who agreed: by this link they can take it back, today or in years. */
export function guardianKeptMail({ pupil, studio }: GuardianKeptData, link: string): Mail {
  return setMail({
    subject: `You agreed for ${pupil}`,
    says: [
      `You agreed that the teachers of "${studio}" at Larkspan see and hear what ${pupil} shares with them.`,
      "Keep this mail: by its link you can look at it again and take your word back at any time. From that moment the teachers see nothing any more.",
    ],
    action: { label: "Look at it or take it back", link },
    foot: [],
  });
}

export interface AssignedData {
  studio: string;
  song: string;
  /** the key for this pupil, in words, such as "B♭ major"; null if none is proposed yet */
  key: string | null;
  /** a day in words; null without one */
  due: string | null;
  note: string | null;
}

/** To a pupil: a song to work on. */
export function assignedMail({ studio, song, key, due, note }: AssignedData, link: string): Mail {
  return setMail({
    subject: `A song for you: ${song}`,
    says: [
      `In "${studio}" you were given "${song}"${key ? `, in ${key} for your voice` : ""}${due ? `. It is due on ${due}` : ""}.`,
    ],
    quote: note,
    action: { label: "Open your sheet", link },
    foot: [],
  });
}

export interface HandedInData {
  pupil: string;
  song: string;
  note: string | null;
}

/** To a teacher: a take has come in. */
export function handedInMail({ pupil, song, note }: HandedInData, link: string): Mail {
  return setMail({
    subject: `${pupil} handed in ${song}`,
    says: [`${pupil} sang "${song}" and handed it in.`],
    quote: note,
    action: { label: "Listen and answer", link },
    foot: [],
  });
}

export interface AnsweredData {
  teacher: string;
  song: string;
  /** null: an answer that decides nothing, such as one that was recorded */
  accepted: boolean | null;
  note: string | null;
}

/** To a pupil: the teacher has answered. */
export function answeredMail({ teacher, song, accepted, note }: AnsweredData, link: string): Mail {
  return setMail({
    subject: accepted ? `${song} is accepted` : `An answer to your take of ${song}`,
    says: [
      accepted === null
        ? `${teacher} recorded an answer to your take of "${song}".`
        : accepted
          ? `${teacher} listened to your take of "${song}" and accepted it.`
          : `${teacher} listened to your take of "${song}" and would like to hear it again.`,
    ],
    quote: note,
    action: { label: "Read the answer", link },
    foot: [],
  });
}

export interface WeeklyData {
  /** one line each, such as "Slack Water: due on 12 December" */
  lines: string[];
}

/** What happened and what is open, once a week to those who asked for it. */
export function weeklyMail({ lines }: WeeklyData, link: string): Mail {
  return setMail({
    subject: "Your week at Larkspan",
    says: lines.length > 0 ? lines : ["Nothing is open this week."],
    action: { label: "Open Larkspan", link },
    foot: [],
  });
}
