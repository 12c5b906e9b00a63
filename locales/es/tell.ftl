# Títulos y oraciones de `tell`.

tell-title = { $place }: { $years }
tell-invented = Este valle es inventado. Está aquí para aprender.
tell-place = Lugar
tell-dials = Perillas
tell-dial-line = { $dial }: { $value }
tell-dials-at-rest = Todas las perillas están en reposo: todavía no hay cambios.
tell-setting = Combinación: { $name }

tell-years-all = los { $n } años, de { $first } a { $last }
tell-years-dry = años secos
tell-years-middling = años regulares
tell-years-wet = años húmedos
tell-year-one = año de agua { $year }
tell-years-between = años de agua de { $first } a { $last }
tell-per-year = Año por año
tell-all-years = Todos los años
tell-water-year = Año de agua
tell-day = Día
tell-mean = Promedio
tell-lowest = El más bajo
tell-highest = El más alto
tell-mean-of-years = Promedio de { $n } años

tell-sign = Lo que se cuenta
tell-as-it-was = Sin cambios
tell-with-your-changes = Con sus cambios
tell-change = Diferencia
tell-no-change = igual
tell-no-clear-change = sin cambio claro
tell-never = nunca
tell-never-in-years = { $n ->
    [one] en { $n } año no
   *[other] en { $n } años no
}
tell-what-changed = Qué cambió
tell-nothing-changed = De lo que aquí se cuenta, nada cambió.

tell-canals = Canales
tell-canals-by-right = Canales, primero el derecho más antiguo
tell-right-before-all = antes que todos
tell-enough = Un año alcanza si llega al menos { $share } del agua pedida.
tell-ledger = Cuentas del agua
tell-ledger-closes = Las cuentas cierran: de { $throughput } queda sin explicar { $residual }.

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
tell-crop-source = Fuente: { $source }
tell-from-memory = de memoria

tell-storms-kept = Las perillas no cambian el orden de las tormentas, los días de lluvia ni el calendario de cultivos.
