# The board: its file on the command line, and what is said of its screens.

help-board = The board file: which screens and hands the board has. It also says the language and the place to start with.
board-screen-lost = This screen does not answer: { $screen }. All goes on, and it is tried again every few seconds. The system says:
board-screen-back = This screen is back: { $screen }.
show-why-no-board-file = A board file must say how it is wired: --board FILE.
