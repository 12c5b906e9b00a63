# What can be wrong with a board file. A message says what is wrong, its .remedy says what would be right.

problem-board-no-screen = The file names no screen.
    .remedy = Add one with a line [[screen]] and below it kind = "panel" or kind = "monitor".
problem-board-device = “{ $value }” is not a device, in “{ $key }”.
    .remedy = Write its whole path: "/dev/gpiochip0".
problem-board-name = “{ $value }” is not a name, in “{ $key }”.
    .remedy = Write the name alone, without slashes.
problem-board-pin-twice = Pin { $pin } is used twice: here as “{ $key }”, and as “{ $other }” in line { $line }.
    .remedy = Put one of the two wires on another pin, and write its number here.
problem-board-pin-of-bus = Pin { $pin } cannot be “{ $key }”: it is { $other }, and line { $line } uses that bus.
    .remedy = Put the wire on a pin that no bus needs, and write its number here.
problem-board-place-twice = Two parts hang at the same place: { $place }. The other is in line { $line }.
    .remedy = Give one of them another bus, another chip_select or another address, on the board too.
problem-board-beyond-memory = Offset and size make { $sum } pixels, but the chip has memory for { $memory }.
    .remedy = Check both numbers. The glass of many small displays starts at 0.
problem-board-too-small = No picture fits on a screen of { $size } pixels.
    .remedy = The smallest picture is 240x240 pixels. Check size and rotation.
problem-board-bars = On a screen of { $size } the picture is { $layout }, with dark bars around it.
    .remedy = It may stay so. Another rotation may fill the screen.
problem-board-rotation = A picture cannot be turned by { $value } degrees.
    .remedy = Write 0, 90, 180 or 270. It turns clockwise.
problem-board-word-bits = This chip cannot take { $value } bits at a time.
    .remedy = Write 8. Only an ili9486 behind shift registers takes 16.
problem-board-time = “{ $key }” is not a time of day: “{ $value }”.
    .remedy = Write hours and minutes, of 24 hours: "21:30".
problem-board-night-empty = The night ends when it begins.
    .remedy = Write two different times, or take the night out.
problem-board-edges-same = “{ $key }” has the same value at both edges.
    .remedy = Touch both edges of the screen and write what is read at each: [200, 3900].
problem-board-edges-per-detent = No encoder has 3 edges from one click to the next.
    .remedy = Write 1, 2 or 4. Most encoders have 4.
problem-board-input-twice = Input { $input } is used twice. The other is in line { $line }.
    .remedy = Each knob has an input of its own. Check the wires.
problem-board-dial-twice = Two hands turn the dial “{ $dial }”. The other is in line { $line }.
    .remedy = Let only one of them turn it. Two knobs would pull it to and fro.
problem-board-two-monitors = There are two monitors, and only one can be used.
    .remedy = Keep one of the two. Small panels may be as many as there are wires for.
