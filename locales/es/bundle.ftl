# Un solo archivo que lleva un lugar, sus lecciones, más idiomas y el archivo de la placa a otra computadora.

help-bundle = Hace un solo archivo de un lugar y lo suyo, para llevarlo en una memoria USB; o abre uno.
help-usage-bundle = [LUGAR] --out ARCHIVO | --open ARCHIVO --into CARPETA
help-bundle-lesson = Una lección que va con él: un archivo, o el nombre de una incluida. Se puede repetir.
help-bundle-board = El archivo de la placa que va con él.
help-bundle-out = El archivo que se hace, por ejemplo mi-valle.zip.
help-bundle-open = El paquete que se abre. Primero se revisa, y de uno dañado no se usa nada.
help-bundle-into = La carpeta donde se abre. Tiene que ser nueva o estar vacía.
help-bundle-more = La carpeta de --locales también va con él.

bundle-made = { $path } está hecho: { $n } archivos en uno.
bundle-opened = El paquete está completo. Sus { $n } archivos están en { $path }.

## Lo que puede estar mal

bundle-open-or-make = Un paquete se hace o se abre, no las dos cosas a la vez.
bundle-needs-into = Diga con --into en qué carpeta se abre el paquete.
bundle-into-only-open = --into va con --open. Un paquete se hace con --out.
bundle-needs-out = Diga con --out qué archivo se hace, o con --open cuál se abre.
bundle-system = No se puede usar { $about }. El sistema dice: { $reason }
bundle-not-one = { $path } no es un paquete o está dañado. No se usó nada de él.
bundle-newer = Un programa más nuevo hizo { $path } (formato { $about }). Para abrirlo hace falta ese programa.
bundle-name = “{ $about }” no sirve como nombre en un paquete. Use letras, cifras, guiones y puntos.
bundle-twice = “{ $about }” está dos veces. Algunas computadoras no distinguen mayúsculas de minúsculas.
bundle-not-a-file = “{ $about }” no es un archivo común. Los enlaces y los dispositivos no van en un paquete.
bundle-too-many = { $path } tiene demasiados archivos para un paquete.
bundle-too-large = “{ $about }” es demasiado grande para un paquete.
bundle-sum = “{ $about }” ya no es como cuando se hizo el paquete. Copie el paquete otra vez. No se usó nada de él.
bundle-missing = Al paquete le falta “{ $about }”. Copie el paquete otra vez. No se usó nada de él.
bundle-unlisted = “{ $about }” no es del paquete: alguien lo agregó después. No se usó nada de él.
bundle-occupied = { $about } ya existe y no está vacía. Nombre una carpeta nueva.
bundle-no-place = En { $path } no hay ningún lugar.
