/** What people say who seek or offer a topic. All hand-written; whole sentences. */
export interface TopicWords {
  seek: readonly string[];
  offer: readonly string[];
}

export const TOPIC_WORDS: Record<string, TopicWords> = {
  'deed-and-plan-research': {
    seek: [
      'I would like to watch someone work through an archive box from start to finish.',
      'Old plans still look to me like drawings rather than evidence.',
    ],
    offer: [
      'I know the registry archive well and can show you how to search it.',
      'Bring me an old plan and we will read it together.',
    ],
  },
  'boundary-disputes': {
    seek: [
      'My first dispute ended in shouting, and I want the second to go better.',
      'How to stay neutral while one side pays the bill is my main question.',
    ],
    offer: [
      'I have sat between many pairs of neighbours and remember most of them fondly.',
      'I can offer a calm ear for disputed lines.',
    ],
  },
  'network-adjustment': {
    seek: ['I would like somebody to question my weights.', 'Least squares was taught to me as a button.'],
    offer: [
      'We can adjust one small network by hand; it changes how one sees the large ones.',
      'I enjoy explaining residuals more than is good for me.',
    ],
  },
  'tidal-datums': {
    seek: [
      'Datum transfer along an indented coast is where I feel least sure.',
      'I want to stop treating tide reduction as someone else’s job.',
    ],
    offer: [
      'I have looked after tide gauges for years and can explain their moods.',
      'Chart datum, land datum and the gap between them are my favourite subject.',
    ],
  },
  multibeam: {
    seek: [
      'I can clean multibeam data and do not yet know how to collect it well.',
      'I would like a second opinion on my calibration runs.',
    ],
    offer: [
      'I have seen most of the ways in which a swath can lie.',
      'I am glad to look at a difficult dataset with you.',
    ],
  },
  'drone-survey': {
    seek: [
      'I have the permit and the aircraft, and too little experience of what goes wrong.',
      'I want to know how others write their operating manuals.',
    ],
    offer: [
      'I have set up two drone teams and closed one, for good reasons.',
      'I can show you my flight checklists and why each line is there.',
    ],
  },
  'building-information': {
    seek: [
      'Every client means something different by a model, and I would like to ask better questions.',
      'I want to agree levels of detail before the scanning, not after.',
    ],
    offer: [
      'I can share the two pages on which we agree a model with clients.',
      'I have worked beside architects for long enough to translate.',
    ],
  },
  'heritage-recording': {
    seek: [
      'I would like to record old buildings and do not know how people earn a living from it.',
      'I want to learn to draw what matters rather than everything.',
    ],
    offer: [
      'Heritage is a small world and I am happy to introduce you to it, after we have met.',
      'I still draw by hand and can teach you to see before you scan.',
    ],
  },
  'spatial-databases': {
    seek: [
      'I want to stop keeping survey data in folders called final.',
      'A database review with an experienced person would help me a great deal.',
    ],
    offer: [
      'I have migrated four survey archives and can tell you what I would not do again.',
      'I like to sketch data models on paper with others.',
    ],
  },
  'machine-control': {
    seek: [
      'Operators ask me things about their screens that I cannot answer.',
      'I want to prepare models that do not surprise anyone in a cab.',
    ],
    offer: [
      'I spent a year in the cabs to understand what operators need.',
      'I can go through a model with you from design file to blade.',
    ],
  },
  'rail-and-track': {
    seek: [
      'Night possessions are new to me, and so is the vocabulary.',
      'I would like to understand track geometry beyond the numbers.',
    ],
    offer: [
      'I know the railway’s rules and the reasons behind them.',
      'Track work has its own time; I can help you plan for it.',
    ],
  },
  'compulsory-purchase': {
    seek: [
      'I dread the moment when I have to tell a family what their field is worth.',
      'I want to understand a purchase scheme from notice to payment.',
    ],
    offer: [
      'I have worked on both sides of compulsory purchase.',
      'I can explain what owners fear, and what they have a right to.',
    ],
  },
  'gyro-and-shaft-transfer': {
    seek: [
      'I have read about shaft plumbing and never done it.',
      'I would like to plan one gyro campaign with someone who has planned twenty.',
    ],
    offer: [
      'I can take you through a shaft transfer step by step, with its error budget.',
      'I have carried direction down more shafts than I care to count.',
    ],
  },
  chartership: {
    seek: [
      'I am preparing for chartership and would like someone to test my answers.',
      'My case study for chartership exists in notes; it needs a critical reader.',
      'I have put off the professional assessment twice and want to stop doing that.',
    ],
    offer: [
      'I have helped several candidates through chartership and know where they get stuck.',
      'I am happy to read case studies and ask the unpleasant questions early.',
      'I remember my own assessment well, including the part I failed first.',
    ],
  },
  'first-site-lead': {
    seek: [
      'I lead a field party for the first time and have nobody to ask in the evening.',
      'I would like to learn to hand work over instead of doing it at night.',
    ],
    offer: [
      'The step to party chief is the one I most like to accompany.',
      'I can help with the first months of leading people in the field.',
    ],
  },
  'fieldwork-safety': {
    seek: [
      'I often work alone and want better habits.',
      'After a near miss this summer I look at our field routines differently.',
    ],
    offer: [
      'I take safety personally and without posters.',
      'I can share how we changed field routines after an accident.',
    ],
  },
  tendering: {
    seek: [
      'I have begun to price small jobs and lose either the job or the margin.',
      'I would like to see how an experienced person reads a tender.',
    ],
    offer: [
      'I have priced work for many years, and wrongly often enough to be useful.',
      'We can take a tender apart together, once it is closed.',
    ],
  },
  'career-break-return': {
    seek: [
      'I return after three years with small children, and the instruments have changed.',
      'I was away to care for my father and need to find my pace again.',
      'After an illness I work part time and want to plan the next steps with care.',
    ],
    offer: [
      'I came back after a long break myself and know how it feels.',
      'I have kept a place in my team for people returning, and they were my best appointments.',
    ],
  },
  'running-a-practice': {
    seek: [
      'I think about starting on my own and would like an honest talk about it.',
      'A friend and I talk about a practice of our own, and I wonder what we overlook.',
    ],
    offer: ['I started with one instrument and a borrowed van.', 'I am open about figures, including the bad years.'],
  },
  'leading-a-team': {
    seek: ['I now manage people who trained me.', 'I want to learn to give feedback before I am annoyed.'],
    offer: [
      'I have led teams from three to thirty and made the usual mistakes.',
      'I like to think aloud about people, in confidence.',
    ],
  },
  'client-conversations': {
    seek: [
      'I say yes too quickly and pay for it later.',
      'I would like to practise the conversation about extra work.',
    ],
    offer: [
      'We can rehearse difficult conversations; it helps more than advice.',
      'I have learned to say no in ways that keep clients.',
    ],
  },
  'report-writing': {
    seek: [
      'My reports are correct and nobody reads them.',
      'I write slowly in English and would like a patient reader.',
    ],
    offer: [
      'I am a fussy reader of reports and kind to those who write them.',
      'Send me two pages and I will send back one.',
    ],
  },
  'expert-witness': {
    seek: [
      'I have been asked to give evidence and feel unprepared.',
      'I would like to know what a court expects from a surveyor.',
    ],
    offer: [
      'I have given evidence many times and can take the fear out of it.',
      'I can explain how a court report differs from any other.',
    ],
  },
  'work-life-balance': {
    seek: [
      'Field weeks and two children are hard to fit together.',
      'I wish to work four days and still be taken seriously.',
    ],
    offer: [
      'I have worked part time for years and run projects all the same.',
      'I can talk openly about field work and family.',
    ],
  },
  'public-service': {
    seek: [
      'I am considering a post with an authority and wonder what I would miss.',
      'I moved to an authority last spring and still write like a contractor.',
    ],
    offer: [
      'I have worked on both sides of the public counter.',
      'I can tell you how decisions are really made in an authority.',
    ],
  },
  'research-and-teaching': {
    seek: [
      'I cannot decide between practice and a doctorate.',
      'I have begun to teach one course and would like to do it well.',
    ],
    offer: [
      'I supervise theses and enjoy visitors from practice.',
      'I went from practice to the university at forty and can say what it costs.',
    ],
  },
  'working-abroad': {
    seek: [
      'I would like to work abroad for a year and come back.',
      'I wonder how far my qualification carries outside Ellmark.',
    ],
    offer: [
      'I have worked in six countries and come home each time.',
      'I can talk about contracts, families and loneliness abroad.',
    ],
  },
  programming: {
    seek: [
      'I repeat the same clicks every week and know there is a better way.',
      'My scripts work as long as nobody else runs them.',
    ],
    offer: [
      'I can look at your scripts without laughing.',
      'A little programming goes a long way in a survey office, and I like to show how.',
    ],
  },
  'quality-assurance': {
    seek: [
      'I want to build checks into our work rather than after it.',
      'I would like to write an error budget and have it torn apart.',
    ],
    offer: [
      'I have audited surveys for years and try to be good company while doing it.',
      'Checking is a habit; I can help you to make it a short one.',
    ],
  },
  succession: {
    seek: [
      'I may one day take over the firm I work in and do not know how to talk about it.',
      'Our senior partner retires in two years, and nobody mentions it.',
    ],
    offer: [
      'I am handing my own practice over, slowly, and can tell you how it goes.',
      'I bought a practice once and know what I should have asked.',
    ],
  },
  presenting: {
    seek: ['I go red in front of more than four people.', 'I have my first talk at the Institute’s spring meeting.'],
    offer: [
      'I was a dreadful speaker and am now a passable one.',
      'We can practise talks together, with slides or without.',
    ],
  },
  'new-in-ellmark': {
    seek: [
      'I came to Ellmark two years ago and still miss the unwritten rules.',
      'My qualification is from abroad, and I want to learn how things are done here.',
    ],
    offer: [
      'I moved here myself and remember what nobody explained.',
      'I can introduce you to how Ellmark works, registry and all.',
    ],
  },
};
