# La orden show: qué pantalla se usa, por qué, y lo que se dice alrededor de la imagen.

help-show = Abre el valle en una pantalla, listo para girar las perillas.
help-usage-show = [LUGAR] [OPCIONES]
help-screen = Dónde mostrarlo: window (ventana), terminal, pictures (imágenes), panel o framebuffer (monitor sin escritorio). Se puede repetir.
help-size = El tamaño de la imagen, por ejemplo 320x240.
help-theme = Colores: light (claros), dark (oscuros) o sunlight (para el sol).
help-show-into = La carpeta para las imágenes.
value-screen = PANTALLA
value-size = TAMAÑO
value-theme = COLORES

show-title = { $place } · deshielo
show-hint = ↑↓ girar  ←→ perilla  Tab vista  Espacio días  L idioma  H ayuda  Ctrl+C fin
show-too-small =
    Esta ventana es muy chica.
    Agrándela: al menos 72 de ancho y 24 de alto.
    Ctrl+C: fin

show-screen-window = ventana
show-screen-terminal = terminal
show-screen-pictures = imágenes
show-screen-panel = pantalla pequeña
show-screen-framebuffer = monitor sin escritorio

show-chosen = Pantalla: { $screen }. { $why }
show-cannot = Aquí no se puede usar esta pantalla: { $screen }. { $why }
show-screen-failed = Dejó de funcionar la pantalla: { $screen }. El sistema dice: { $reason }
show-no-answer = El registro no tiene ningún año de agua completo, así que no hay nada que mostrar.
show-pictures-written = { $n ->
    [one] Hay { $n } imagen en { $path }.
   *[other] Hay { $n } imágenes en { $path }.
}
show-folder-unwritable = No se pueden guardar imágenes en { $path }: { $reason }. Lo que había antes sigue igual.

show-why-board-file = La indica el archivo de la placa.
show-why-desktop = Esta computadora tiene escritorio.
show-why-no-desktop = Aquí no hay escritorio donde abrir una ventana.
show-why-desktop-elsewhere = El escritorio está en otra computadora, y este programa nunca usa la red.
show-why-window-not-built = Este programa se armó sin ventana.
show-why-window-failed = No se pudo abrir la ventana.
show-why-no-terminal = No hay nadie frente a una terminal.
show-why-plain-terminal = Esta terminal no puede mostrar colores.
show-why-board-not-built = Este programa se armó sin lo necesario para usarla.
