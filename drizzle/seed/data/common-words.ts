/** Sentence parts that fit people of any practice area. All hand-written. */
import type { CareerStage, MeetingMode } from '../../../shared/profiles/profiles-contract';

/** How a mentee starts, by career stage. */
export const MENTEE_OPENING: Record<CareerStage, readonly string[]> = {
  student: [
    'I finish my degree next summer.',
    'I study in Greyford and spend my holidays on survey boats and building sites.',
    'Two years of lectures are behind me, and one summer in the field was enough to know what I want.',
    'I am writing my thesis and asking myself what comes after it.',
  ],
  graduate: [
    'I started work not long ago.',
    'This is my second job and the first in which I may decide things.',
    'I am past the stage of carrying the tripod, though not by much.',
    'Since I graduated I have moved between three teams.',
    'I am new enough to ask and old enough to be expected to know.',
    'My time in practice so far has been one long field season.',
  ],
  candidate: [
    'I hope to become chartered within the next two years.',
    'I am on the way to chartership and in the middle of my log book.',
    'My supervisor is kind and always away, so I prepare mostly alone.',
    'I have the experience on paper and now need to explain it.',
    'The assessment is next year; the doubts are here already.',
  ],
  chartered: [
    'I have been chartered for a while and feel the next step coming without seeing it.',
    'For the first time nobody tells me what to learn next.',
    'I know my own field and want to look over its fence.',
    'After some good years I have become too comfortable.',
    'I was promoted faster than I learned to lead.',
  ],
  senior: [
    'I have been in practice for a long time and have seldom been asked a hard question lately.',
    'I am at the point where most people mentor, and I hope to be mentored once more.',
    'I take on a new kind of work after many years of another.',
  ],
  returning: [
    'I am returning to practice after some years away.',
    'I stopped work when my second child was born and start again this winter.',
    'I am back at my desk after a long illness, three days a week.',
    'I spent five years in another trade and have come home to surveying.',
  ],
};

export const MENTEE_CLOSING: readonly string[] = [
  'I take criticism well, provided it comes with an example.',
  'I learn best from stories about things that went wrong.',
  'An hour a month with somebody outside my office would be worth a great deal.',
  'I would be glad of somebody who asks more than they answer.',
  'I will come prepared; that much I can promise.',
  'It would help to hear how somebody else got past this point.',
  'What I need is less advice than a clear mirror.',
  'I do not expect a career plan, only better questions.',
  'I should like to be held to what I say I will do.',
  'Somebody patient would suit me; I think slowly and then act.',
  'I hope to give something back one day, when I know more.',
  'A mentor who disagrees with me now and then would be ideal.',
  'Honest answers matter more to me than encouraging ones.',
  'I prefer one subject done properly to a tour of everything.',
  'If we laugh now and then, so much the better.',
  'I am not looking for a job, only for a wider view.',
];

/** How a mentor starts; `{years}` is replaced by a number in words or figures. */
export const MENTOR_OPENING: readonly string[] = [
  'After {years} years in practice I have more questions than when I began, and better ones.',
  'I have {years} years behind me and was well looked after at the start of them.',
  'In {years} years I have changed employer four times and my mind more often.',
  'I had a good mentor early on, and {years} years later I still hear her voice.',
  'With {years} years in the trade I know a few short cuts and several dead ends.',
  'My {years} years were not a straight line, which may be the useful part.',
  'Nobody explained anything to me in my first job; {years} years later I try to do better.',
  'I have {years} years of field books and enjoy opening them for others.',
  'It took me {years} years to learn that most survey problems are about people.',
  'I became a surveyor by accident {years} years ago and have never regretted it.',
  'What I know after {years} years fits on two pages; how I came to know it takes longer to tell.',
];

export const MENTOR_CLOSING: readonly string[] = [
  'I would rather help you think than tell you what to do.',
  'I hope to learn how the work looks to somebody who starts today.',
  'I will be honest, discreet and on time.',
  'You bring the questions; I bring patience and coffee.',
  'I am most useful to somebody who has a decision in front of them.',
  'I expect you to prepare, and I shall do the same.',
  'It pleases me when somebody needs me a little less each month.',
  'I enjoy people whose way of thinking differs from mine.',
  'If I do not know something I usually know whom to ask.',
  'I have time for this now, and I did not always.',
  'I have no wish to make copies of myself.',
  'Success for me would be that you outgrow our talks.',
  'I like to visit a site together once, if we can.',
  'I offer an outside view and a long memory.',
];

export const STYLE_OPENING: readonly string[] = [
  'I like a fixed hour and an agenda of three lines.',
  'I prefer to talk while walking.',
  'I think best with paper and pencil between us.',
  'I write a few lines before each meeting and after it.',
  'Short and often suits me better than long and rarely.',
  'A quiet conversation without slides is enough for me.',
  'I listen first and speak late.',
  'I am direct, and glad when others are.',
  'I like to start with what happened since last time.',
  'I need some time to warm up and then have a lot to say.',
  'I work in questions rather than answers.',
  'Concrete cases help me more than principles.',
  'I like to finish each talk with one thing to try.',
  'I am informal and punctual.',
  'I read everything that is sent to me the evening before.',
  'I prefer the telephone to a camera.',
];

export const STYLE_HABIT: readonly string[] = [
  'Between meetings a short message is always welcome.',
  'I keep notes and share them.',
  'I do not mind silence.',
  'If a month is full, please say so and we move the date.',
  'I look at drawings and data rather than at slides.',
  'I ask for feedback on myself half-way through.',
  'I tell stories and can be stopped.',
  'What we say stays between us.',
  'I like to meet once at the other’s place of work.',
  'Changes of plan do not trouble me, provided I hear of them.',
  'I draw while I think.',
  'I like a little homework, on both sides.',
  'I keep strictly to the hour.',
  'I would agree the first three dates at once.',
  'I say when I do not understand, and hope for the same.',
  'I am better in the morning than in the evening.',
  'I prefer plain words to clever ones.',
];

export const MODE_SENTENCE: Record<MeetingMode, readonly string[]> = {
  'in-person': [
    'I would like to meet face to face and will travel for it.',
    'Video calls tire me, so I hope to sit at the same table.',
    'For me this works only in the same room.',
  ],
  remote: [
    'Field weeks make travel difficult, so I meet by video.',
    'I live far from most offices and am used to meeting on the screen.',
    'Remote meetings fit my week best.',
  ],
  both: [
    'A first meeting in person and the rest by video would be ideal.',
    'I am happy with a table or a screen.',
    'In person when the roads allow it, by video otherwise.',
    'Where we meet does not matter to me.',
  ],
};

export const GENERAL_LIMITS: readonly string[] = [
  'I cannot find anybody a job.',
  'I do not act as a referee for applications.',
  'Pay negotiations are not my strength.',
  'I am no substitute for a line manager.',
  'I would not comment on people I work with.',
  'Please do not ask me about software licences.',
  'I cannot give legal or tax advice.',
  'July and August are field season and I am slow to answer.',
  'I do not look at live tenders.',
  'I am not good with last-minute requests.',
  'Anything to do with my own employer’s disputes is off the table.',
  'I can listen to personal troubles, but for help I would send you to others.',
];

export const MENTEE_LIMITS: readonly string[] = [
  'I cannot share data from client projects.',
  'I am away on field work for weeks at a time and will say so early.',
  'Fridays are for my family.',
  'I cannot meet in the weeks before our year-end.',
  'I would rather not talk about my present manager.',
  'I do not drive, so I depend on trains and ferries.',
  'Evenings are difficult until the children are asleep.',
  'I share an office, so calls need a little planning.',
  'I cannot take on extra project work at present.',
  'Mondays are full of site meetings.',
  'I am slow to answer messages and quick to answer calls.',
  'I would like to keep my employer’s tenders out of our talks.',
  'Long trips are difficult for me at present.',
  'I sing in a choir on Tuesdays and do not give that up.',
  'I look after my mother at weekends.',
  'I cannot promise the same day every month.',
  'From May to September I depend on the weather.',
  'I do not wish to discuss pay.',
  'I am no good with shared calendars and will need reminding.',
];

export const STUDENT_LIMITS: readonly string[] = [
  'I have examinations in January and June.',
  'I do not drive, so I depend on trains and ferries.',
  'I work in a café at weekends.',
  'I know little of everyday practice yet and will ask simple things.',
  'In the summer I am away on a placement.',
  'My timetable changes every term.',
  'I share a small flat, so calls need a little planning.',
];

/** How a mentee frames a goal for one cycle; the goal itself follows "I want to". */
export const GOAL_OPENING: readonly string[] = [
  'By the end of the cycle I want to',
  'In these months I want to',
  'My goal for this cycle is simple to say: I want to',
  'When we close I want to be able to say that I can',
  'First of all I want to',
  'Before next summer I want to',
  'This time I want to',
  'Above all I want to',
];

export const GOAL_MEASURE: readonly string[] = [
  'I will know it has worked when my manager stops checking this part of my work.',
  'A finished piece of work that we have both looked at would be proof enough.',
  'I would like to look at one real case every month.',
  'I plan to write one page after each meeting and to keep them.',
  'At mid-point I should like us to ask whether this is still the right aim.',
  'I have a project in the spring on which I can try it out.',
  'If it works I will show it to my own team.',
  'Small steps are fine; standing still is not.',
  'I have two evenings a week to work on it.',
  'I have told my employer about it, so there is no way back.',
  'I measure it by sleeping better before difficult days.',
  'One honest conversation a month would already move me on.',
  'I would count it a success to need help with something else by then.',
  'My employer gives me half a day a month for this.',
];

/** What a mentor writes about goals for one cycle. */
export const MENTOR_GOAL: readonly string[] = [
  'I would like to accompany one person properly rather than several in passing.',
  'This cycle I hope for somebody outside my own kind of firm.',
  'I want to get better at asking and slower at answering.',
  'I hope to pass on what I was given.',
  'I have room in my calendar until the summer and would like to use it well.',
  'I should like to meet somebody who is about to take a first lead.',
  'I am curious about how younger colleagues see the trade.',
  'Last time I talked too much; this time I shall listen.',
  'I want to help somebody through chartership without drama.',
  'I hope that somebody returning to practice will find my door open.',
  'I would enjoy a mentee whose strengths are not mine.',
  'Two mentees would let me see the same question from two sides.',
];

export const ADJUSTMENTS: readonly string[] = [
  'I use hearing aids: video with captions, please, or a quiet room.',
  'I need step-free access where we meet.',
  'I am dyslexic; please send longer texts a few days ahead.',
  'I need breaks every forty minutes.',
  'Bright screens give me migraines, so telephone is better than video.',
];

export const CREDENTIALS: Record<CareerStage, readonly string[]> = {
  student: ['Student member', ''],
  graduate: ['BSc Surveying and Mapping', 'BEng Geomatics', 'MSc Geoinformation', 'MSc Surveying'],
  candidate: [
    'BSc Surveying, candidate member',
    'MSc Geodesy, candidate member',
    'BEng Civil Engineering, candidate member',
  ],
  chartered: ['Chartered member', 'Chartered member, MSc Geomatics', 'Chartered member, site safety certificate'],
  senior: [
    'Fellow of the Institute',
    'Chartered member',
    'Fellow, former examiner',
    'Chartered member, doctorate in geodesy',
  ],
  returning: ['Chartered member', 'BSc Surveying', 'Chartered member, on leave until this year'],
};
