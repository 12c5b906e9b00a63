# Day before month; September has four letters.

month-9 = September
    .short = Sept
    .letter = S
date-short = { $day } { $month }
date-in-sentence = { $day } { $month }
date-in-sentence-long = { $day } { $month }
date-long = { $day } { $month } { $year }
date-range-in-month = { $a } to { $b } { $month }
date-range = { $a } { $month_a } to { $b } { $month_b }
