# British spelling.

term-ditch = ditch
    .short = Ditch
    .plain = A small channel, often shared by neighbours.
term-units = units
    .short = Units
    .plain = Acre-feet or cubic metres; feet or metres.
