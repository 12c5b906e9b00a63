# The map of two dials on the running instrument: what the knob can choose for it.

ring-map-sign = Map shows
ring-map-across = Map, across
ring-map-up = Map, upward
