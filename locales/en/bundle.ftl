# One file that carries a place, its lessons, more languages and a board file to another computer.

help-bundle = Makes one file of a place and what belongs to it, to carry on a stick; or opens such a file.
help-usage-bundle = [PLACE] --out FILE | --open FILE --into FOLDER
help-bundle-lesson = A lesson that goes with it: a file, or the name of a built-in one. Can be given more than once.
help-bundle-board = The board file that goes with it.
help-bundle-out = The file to make, for example my-valley.zip.
help-bundle-open = The bundle to open. It is checked first, and nothing of a damaged one is used.
help-bundle-into = The folder that it is opened into. It must be new or empty.
help-bundle-more = The folder of --locales goes with it too.

bundle-made = { $path } is made: { $n } files in one.
bundle-opened = The bundle is whole. Its { $n } files are in { $path }.

## What can be wrong

bundle-open-or-make = A bundle is made or opened, not both at once.
bundle-needs-into = Say with --into which folder the bundle is opened into.
bundle-into-only-open = --into belongs to --open. A bundle is made with --out.
bundle-needs-out = Say with --out which file to make, or with --open which one to open.
bundle-system = { $about } cannot be used. The system says: { $reason }
bundle-not-one = { $path } is not a bundle, or it is damaged. Nothing of it was used.
bundle-newer = { $path } was made by a newer program (format { $about }). Get the newer program to open it.
bundle-name = “{ $about }” is not a name that a bundle can have. Use letters, digits, hyphens and full stops.
bundle-twice = “{ $about }” is there twice. Some computers do not tell capital letters from small ones.
bundle-not-a-file = “{ $about }” is not a plain file. Links and devices cannot go in a bundle.
bundle-too-many = { $path } has too many files for a bundle.
bundle-too-large = “{ $about }” is too large for a bundle.
bundle-sum = “{ $about }” is not as it was when the bundle was made. Copy the bundle again. Nothing of it was used.
bundle-missing = “{ $about }” is missing from the bundle. Copy the bundle again. Nothing of it was used.
bundle-unlisted = “{ $about }” does not belong to the bundle. Someone added it later. Nothing of it was used.
bundle-occupied = { $about } is there already and is not empty. Name a new folder.
bundle-no-place = { $path } has no place in it.
