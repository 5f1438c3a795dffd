/** Stand in every report, mail and answer with flags, in these words. */
export const CAUTIONS: readonly string[] = [
  'This is a screen for planning and for talking, not a medical device and not a diagnosis; the team physician decides on health, the coach on training.',
  'Load figures describe training. They foretell no injury, false alarms are common, and an athlete without a flag is not thereby well.',
  'Tiredness that lasts has many causes outside training (infection, too little food, lack of iron or sleep, life); a physician has to rule them out before it is blamed on load.',
  'Chest pain, fainting, palpitations, unusual breathlessness or fever: to a physician at once. Performance down for more than about two weeks in spite of rest, loss of weight, changes of the cycle, low mood or infections that return: to a physician soon (general practice of sports medicine, value from memory).',
  'Figures of adults do not fit minors: guardians and coach decide together, health goes first, and no load is raised on the strength of a figure.',
  'Local rules and those of the federation come before anything written here. Nothing here is meant for selection, contracts or insurance.',
];
