/** The public introductions and the consent text of the demo association's cycles. */

export const CONSENT_TEXT = `I take part of my own free will and may leave at any time, without giving a reason.

I agree that the Institute uses my mentoring profile and this application to find a mentor or a mentee for me. Coordinators may read both. What I have marked as private is read by coordinators only.

Before we both accept, the other person sees my name, photo, headline, practice and what we share, and no contact details.

I follow the code of conduct: I keep what I hear in confidence, except where somebody is at risk or the law requires otherwise; I make no use of the other person’s position; I say so when a conflict of interest arises; I treat the other person with respect and keep the times we agree.

I may see, correct and download my data at any time, and ask for their erasure. Pseudonymised figures stay in the statistics.`;

export const INTRODUCTION = {
  summer2026: `Six months, a meeting every four to six weeks, and one person outside your own office who has time for you. Members at every stage were welcome, from students to those returning to practice.`,
  winter2026: `The winter cycle brings together members who would like to think about their work with somebody more experienced, and members who offer their time. Pairs meet about once a month from January to the summer, in person or by video.

We look above all for mentors in hydrographic work on the Islands and in mine and tunnel surveying: last time there were more seekers than places.`,
  summer2027: `Applications for the summer cycle are open. Fill in your mentoring profile first: practice areas, languages and the times that suit you decide whom we can pair you with. Mentors are asked for about an hour a month for each mentee; most take one or two.

Hydrographic surveyors and mine surveyors who can offer a place are especially welcome.`,
} as const;
