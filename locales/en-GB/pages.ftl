# Whole messages that differ in Britain.

key-shade = other colours
