# British spelling.

ledger-river-out = River leaving the valley
    .short = River out
    .plain = What flows on to the neighbours downstream.
