# Hands of a board, the table of wires, and the test card.

help-wiring = Shows how to wire a board, and tests its screen and every hand.
help-usage-wiring = [BOARD] [OPTIONS]
help-wiring-board = The board file. Examples are in cross/boards.
help-wiring-more =
    First comes a table of every wire. Then the screen of the board shows a test card and what each hand says. The pages
    turn by themselves, so nothing needs to be touched. On another computer: --screen window, terminal or pictures.
    Example: deshielo wiring board.toml --screen pictures

## What hands are called

hand-input-device = { $name }
hand-touchscreen = Touch: { $name }
hand-encoder = Knob on { $a } and { $b }
hand-shaft-button = Its button on { $pin }
hand-button = Button on { $pin }
hand-knob = { $dial } (input { $input })
hand-here = This computer

## What hands say

hand-silent = nothing yet
hand-closed = closed
hand-open = open
hand-contacts = A { $a }, B { $b }
hand-turned = turned { $detents }
hand-pressed = pressed
hand-held = held
hand-share = { $percent } %
hand-at = at { $x }, { $y }
hand-key = key { $key }
hand-some-key = a key
hand-lost = not there
hand-stuck-button = stays down
hand-stuck-one-contact = one contact only
hand-stuck-loose = wavers
board-hand-lost = This hand does not answer: { $hand }. All goes on, and it is tried again every few seconds. The system says:
board-hand-stuck = Something is wrong with this hand: { $hand }. It says: { $what }.
board-hand-back = This hand answers: { $hand }.

## The test card

test-card-red = red
test-card-green = green
test-card-blue = blue
test-card-size = { $width } × { $height }
test-card-look = The arrow points up, the ring is round, a thin white line runs all around, and each color bears its own name. If not, change rotation_deg, offset_x_px, blue_first or inverted in the board file.
test-card-hands = Hands
wiring-foot = Escape ends. The pages turn by themselves.
wiring-touch-each = Turn and press each one. A ring means: nothing heard yet.
wiring-all-heard = Every hand was heard. Well done.
wiring-stuck = A triangle marks what cannot be right. Unplug the board, then look at the wires of that hand.
wiring-no-hands = The board file names no hands.
wiring-no-board = No board file was named, so the hands of the board are not looked for.
wiring-nothing = Which board? Name a board file, or a screen with --screen.
wiring-only-table = The screen of this board is not at this computer: only the table was printed. To see the test card here, add --screen window, terminal or pictures.

## What to do when something is silent

silent-screen =
    Dark: is the backlight wired, and is there 3.3 V at its supply? White or grey: look at the wires for reset and data/command. Garbled: lower speed_mhz, and shorten the wires. Nothing in the list /dev/spidev*: switch the SPI bus on in the settings of the system.
    .title = If the screen shows nothing
silent-input-device =
    Is its name in the list of the system (/proc/bus/input/devices)? If not, plug it in again, or look at the overlay that the kernel should load. If the name is there, does the board file say the same? May you read it? The user must be in the group input.
    .title = If a plugged-in hand is silent
    .brief = Plug it in. Is its name right in the board file?
silent-touchscreen =
    Is its name in the list of the system (/proc/bus/input/devices)? If it answers in the wrong place, change left_right_raw and top_bottom_raw. If left and right are up and down, change axes_swapped.
    .title = If touching does nothing
    .brief = Is the touchscreen's name right in the board file?
silent-encoder =
    Turn slowly and watch A and B: both must open and close. One never changes: its wire is loose. Neither does: the middle pin must go to ground. It turns the wrong way: write reversed = true. Two clicks for one step: change edges_per_detent.
    .title = If a knob on pins is silent
    .brief = Are the pins free, and is gpio_chip right? The user must be in the group gpio.
silent-button =
    Press and watch: closed must become open and back. Never closed: one leg goes to the pin, the other to ground, and the legs that belong together are side by side on many buttons. Always closed: the two wires touch.
    .title = If a button is silent
    .brief = Is the pin free, and is gpio_chip right? The user must be in the group gpio.
silent-converter =
    Turn and watch the bar. All stay still: is the bus switched on in the settings of the system, and is the address or chip select right? One stays still: its middle wire is loose. It wavers: the middle wire hangs in the air. It never reaches the end: change low_end_percent or high_end_percent.
    .title = If a knob with a bar is silent
    .brief = Is the bus switched on, and is the chip wired?

## The table of wires

wiring-first = Before you wire anything
wiring-unpowered = Unplug the board from its power. Wire only while it is unplugged.
wiring-volts = Every signal is 3.3 V. 5 V on a pin destroys the board. Parts run from 3.3 V here.
wiring-mains = Use a bought power supply that is closed all around. Anything that touches the mains is work for a licensed electrician.
wiring-look-twice = Look at supply and ground twice, then plug the board in.
wiring-column-end = Pin of the part
wiring-column-to = Goes to
wiring-column-place = Place on the header
wiring-panel = Screen { $n }: panel with { $chip }
wiring-monitor = Screen { $n }: monitor
wiring-converter = Converter { $chip }
wiring-plugged-in = Plug it into its socket. It has no wires of its own.
wiring-of-touchscreen = It is part of the display. The maker's page says which pins it uses.
wiring-of-system = Plug it in, or wire it to the pins that the overlay of the kernel names.
wire-supply = supply (VCC, VDD)
wire-ground = ground (GND)
wire-clock = clock (SCK, SCL, CLK)
wire-data-in = data in (MOSI, SDA, DIN)
wire-data-out = data out (MISO, DOUT)
wire-chip-select = chip select (CS)
wire-data-command = data/command (DC, RS)
wire-reset = reset (RES, RST)
wire-backlight = backlight (BL, LED)
wire-serial-data = data (SDA)
wire-serial-clock = clock (SCL)
wire-address = address (ADDR)
wire-contact-a = contact A (CLK)
wire-contact-b = contact B (DT)
wire-shaft-button = button (SW)
wire-contact = one side
wire-common = other side of every contact
wire-input = input { $n }
wire-left-ends = left end of every knob
wire-right-ends = right end of every knob
wire-to-pin = GPIO { $pin }
wire-to-supply = 3.3 V
wire-to-ground = ground
wire-to-wiper = middle of the knob: { $dial }
