# The show command: which screen is used, why, and what is said around the picture.

help-show = Opens the valley on a screen, ready to turn the dials.
help-usage-show = [PLACE] [OPTIONS]
help-screen = Where to show it: window, terminal, pictures, panel or framebuffer. Can be given more than once.
help-size = The size of the picture, for example 320x240.
help-theme = Colors: light, dark or sunlight.
help-show-into = The folder for pictures.
value-screen = SCREEN
value-size = SIZE
value-theme = COLORS

show-title = { $place } · deshielo
show-hint = ↑↓ turn  ←→ dial  Tab view  Space play  L language  H help  Ctrl+C end
show-too-small =
    This window is too small.
    Make it at least 72 wide, 24 high.
    Ctrl+C: end

show-screen-window = window
show-screen-terminal = terminal
show-screen-pictures = pictures
show-screen-panel = small panel
show-screen-framebuffer = monitor without a desktop

show-chosen = Screen: { $screen }. { $why }
show-cannot = This screen cannot be used here: { $screen }. { $why }
show-screen-failed = The screen stopped working: { $screen }. The system says: { $reason }
show-no-answer = The record has no whole water year, so there is nothing to show.
show-pictures-written = { $n ->
    [one] { $n } picture is in { $path }.
   *[other] { $n } pictures are in { $path }.
}
show-folder-unwritable = Pictures cannot be written to { $path }: { $reason }. What was there before is as it was.

show-why-board-file = The board file names it.
show-why-desktop = This computer has a desktop.
show-why-no-desktop = There is no desktop here to open a window on.
show-why-desktop-elsewhere = The desktop is on another computer, and this program never uses the network.
show-why-window-not-built = This program was built without a window.
show-why-window-failed = The window could not be opened.
show-why-no-terminal = Nobody is at a terminal.
show-why-plain-terminal = This terminal cannot show colors.
show-why-board-not-built = This program was built without support for it.
