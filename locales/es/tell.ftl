# Títulos y oraciones de `tell`.

tell-title = { $place }: { $years }
tell-invented = Este valle es inventado. Está aquí para aprender.
tell-dials = Con estos cambios:
tell-dial-line = { $dial }: { $value }
tell-dials-at-rest = Ninguna perilla se ha movido: todavía no hay cambios.
tell-setting = Combinación: { $name }

tell-years-all = los { $n } años de agua, de { $first } a { $last }
tell-years-dry = { $n ->
    [one] el año de agua más seco de { $of }
   *[other] los { $n } años de agua más secos de { $of }
}
tell-years-middling = { $n ->
    [one] el año de agua regular de { $of }
   *[other] los { $n } años de agua regulares de { $of }
}
tell-years-wet = { $n ->
    [one] el año de agua más húmedo de { $of }
   *[other] los { $n } años de agua más húmedos de { $of }
}
tell-year-one = año de agua { $year }
tell-years-between = años de agua de { $first } a { $last }
tell-over-one-year = Año de agua { $year }
tell-mean-of-years = Promedio de { $n } años

tell-as-it-was = Sin cambios
tell-with-your-changes = Con sus cambios
tell-change = Diferencia
tell-no-change = igual
tell-never = nunca
tell-name-and-unit = { $name }, { $unit }
tell-years-of = { $k } de { $n }
tell-years-fewer = { $n ->
    [one] { $n } año menos
   *[other] { $n } años menos
}
tell-years-more = { $n ->
    [one] { $n } año más
   *[other] { $n } años más
}
tell-days-fewer = { $n ->
    [one] { $n } día menos
   *[other] { $n } días menos
}
tell-days-more = { $n ->
    [one] { $n } día más
   *[other] { $n } días más
}
# Partes de cien.
tell-points-less = { $n ->
    [one] { $n } punto menos
   *[other] { $n } puntos menos
}
tell-points-more = { $n ->
    [one] { $n } punto más
   *[other] { $n } puntos más
}
tell-reservoir-fills = Años en que se llena la presa

tell-canals-downstream = Canales, río abajo
tell-canals-by-right = Canales, primero el derecho más antiguo
tell-canal-with-changes = con sus cambios
tell-canal-since = Desde
tell-canal-share = Llegó
tell-canal-enough = Alcanza en años
tell-canal-full = Días con todo
tell-canal-short = Días con parte
tell-canal-cut = Días sin agua
tell-canal-last-full = Último día completo
tell-canal-last-water = Última agua
tell-canal-before-all = primero
tell-right-before-all = antes que todos
tell-enough = En un año alcanza el agua si llega al menos { $share } de la pedida. Con todo, con parte, sin agua: lo que llegó de lo pedido ese día.
tell-ledger-closes = Las cuentas cierran: de { $throughput } queda sin explicar { $residual }.
tell-less-than-a-liter = menos de un litro

tell-method = Evaporación de referencia: { $method }
tell-method-penman-monteith = Penman–Monteith (FAO-56)
tell-method-hargreaves-samani = Hargreaves–Samani (1985)
tell-method-oudin = Oudin y otros (2005)
tell-method-given = una columna del registro
tell-method-per-degree = Con { $degree } más de calor, los cultivos pueden perder al aire cerca de { $percent } más de agua.
tell-rule = Cómo se reparte el agua: { $rule }
tell-rule-seniority = por la fecha del derecho
tell-rule-proportional = a todos la misma parte
tell-rule-rotation = por turnos
tell-gaps = { $n ->
    [one] Faltaba { $n } dato en el registro y se llenó según la regla.
   *[other] Faltaban { $n } datos en el registro y se llenaron según la regla.
}
tell-crops = Cultivos
tell-crops-none = Aquí no crece ningún cultivo.
tell-place-notes = { $n ->
    [one] Hay { $n } nota sobre este lugar. Para verla: deshielo check { $path }
   *[other] Hay { $n } notas sobre este lugar. Para verlas: deshielo check { $path }
}
tell-how-to-go-on =
    Pruebe: deshielo tell demo --set warming=2
    Ayuda: deshielo --help

tell-rounded = Cada número se redondea por su lado; una diferencia puede verse corrida en uno.
tell-fill-dates = La fecha de llenado es el promedio de los años en que se llena; la diferencia, la de los años en que se llena con y sin cambios.
tell-storms-kept = Las perillas no cambian el orden de las tormentas, los días de lluvia ni el calendario de cultivos.

## Cultivos

crop-column-name = Cultivo
crop-column-coefficients = Coeficientes: inicio / medio / final
crop-column-stages = Días de las cuatro etapas
crop-column-roots = Raíces
crop-column-depletion = Agua fácil
crop-column-yield = Factor de cosecha
crop-and-source = { $crop }: { $source }.
crop-source-coefficients = coeficientes, FAO-56 (1998) cuadro 12{ $memory }
crop-source-stages = etapas, FAO-56 cuadro 11{ $memory }
crop-source-stages-ours = etapas escogidas para este programa, sin fuente
crop-source-roots = raíces y agua fácil, FAO-56 cuadro 22{ $memory }
crop-source-yield = factor de cosecha, FAO-33 (1979){ $memory }
crop-source-memory = { " " }(de memoria)
crop-source-place = todos los números son del lugar mismo
crop-source-none = sin temporada, no pide agua; sin fuente
