# What can be wrong with a lesson. A message says what is wrong, its .remedy says what would be right.

problem-lesson-long = A lesson has at most { $most } steps, and this is one more.
    .remedy = Make two lessons of it.
problem-lesson-text-long = “{ $key }” has { $letters } letters in “{ $language }”. The screen has room for { $most }.
    .remedy = Say it in fewer words, or in two steps.
problem-lesson-year = { $near ->
        [0] The record has no year “{ $value }”.
       *[other] The record has no year “{ $value }”. Did you mean “{ $nearest }”?
    }
    .remedy = Write "dry", "middling", "wet", "driest", "wettest", or a water year from { $first } to { $last }.
problem-lesson-dial-absent = This place does not have the dial “{ $dial }”, so this step cannot be shown here.
    .remedy = Take the step out, or use the lesson with a place that has this dial.
problem-lesson-dial-outside = The dial “{ $dial }” stands at { $value }, but this step allows only { $least } to { $most }.
    .remedy = Set it inside these limits, or widen them.
problem-lesson-sign = There is no sign “{ $value }” to read.
    .remedy = { $near ->
        [0] Known here: { $choices }.
       *[other] Did you mean “{ $nearest }”?
    }
problem-lesson-canal-sign = There is no sign “{ $value }” of a canal.
    .remedy = { $near ->
        [0] Known here: { $choices }.
       *[other] Did you mean “{ $nearest }”?
    }
problem-lesson-canal = This place has no canal “{ $value }”.
    .remedy = { $near ->
        [0] Write "oldest", "newest", "town" or a canal's key.
       *[other] Write "oldest", "newest", "town" or a canal's key. Did you mean “{ $nearest }”?
    }
problem-lesson-step-unknown = No step has the key “{ $key }”.
    .remedy = { $near ->
        [0] Known here: { $choices }. The word "end" ends the lesson.
       *[other] Did you mean “{ $nearest }”? The word "end" ends the lesson.
    }
problem-lesson-step-back = The step “{ $key }” does not come later, and a lesson only goes on.
    .remedy = Name a step further down in the file.
problem-lesson-unreachable = No step leads to “{ $key }”, so nobody will see it.
    .remedy = Let an earlier step go there, or take this one out.
problem-lesson-guess-stops = This guess has { $stops } places where the knob can stand. There must be 2 to { $most }.
    .remedy = Change least, most or step.
problem-lesson-usual-outside = The usual answer { $value } cannot be guessed: the knob goes from { $least } to { $most }.
    .remedy = Widen the limits of the guess.
problem-lesson-guess-nothing = What is guessed here does not happen in this year.
    .remedy = Choose another year or another sign. A reservoir that never fills has no day on which it does.
problem-lesson-guess-range = Nobody can guess right: { $came } comes out, and the knob goes from { $least } to { $most }.
    .remedy = Widen the limits of the guess.
problem-lesson-usual-right = The usual answer is called wrong, but { $came } comes out, and that is close.
    .remedy = Change the usual answer, or take it out.
problem-lesson-expect-above = This should be above { $level }. What came out is { $came }.
    .remedy = Correct the lesson: what it teaches does not hold on this place.
problem-lesson-expect-below = This should be below { $level }. What came out is { $came }.
    .remedy = Correct the lesson: what it teaches does not hold on this place.
problem-lesson-expect-between = This should be from { $least } to { $most }. What came out is { $came }.
    .remedy = Correct the lesson: what it teaches does not hold on this place.
problem-lesson-expect-none = This should not happen at all. What came out is { $came }.
    .remedy = Correct the lesson: what it teaches does not hold on this place.
problem-lesson-expect-nothing = A value was expected here, and nothing came out: it does not happen in this year.
    .remedy = Correct the lesson. Where nothing is right, write is = "none".
