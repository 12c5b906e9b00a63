# Unidades: el símbolo; `amount` con un número (hueco delgado); `words` con todas las letras; `name` en plural.

unit-celsius = °C
    .amount = { $n }{ "\u202F" }°C
    .words = { $n ->
        [one] { $n } grado Celsius
       *[other] { $n } grados Celsius
    }
    .name = grados Celsius

unit-fahrenheit = °F
    .amount = { $n }{ "\u202F" }°F
    .words = { $n ->
        [one] { $n } grado Fahrenheit
       *[other] { $n } grados Fahrenheit
    }
    .name = grados Fahrenheit

unit-millimeters = mm
    .amount = { $n }{ "\u202F" }mm
    .words = { $n ->
        [one] { $n } milímetro
       *[other] { $n } milímetros
    }
    .name = milímetros

unit-inches = pulg
    .amount = { $n }{ "\u202F" }pulg
    .words = { $n ->
        [one] { $n } pulgada
       *[other] { $n } pulgadas
    }
    .name = pulgadas

unit-cubic-hectometers = hm³
    .amount = { $n }{ "\u202F" }hm³
    .words = { $n ->
        [one] { $n } millón de metros cúbicos
       *[other] { $n } millones de metros cúbicos
    }
    .name = millones de metros cúbicos

unit-megaliters = ML
    .amount = { $n }{ "\u202F" }ML
    .words = { $n ->
        [one] { $n } megalitro
       *[other] { $n } megalitros
    }
    .name = megalitros

unit-cubic-meters = m³
    .amount = { $n }{ "\u202F" }m³
    .words = { $n ->
        [one] { $n } metro cúbico
       *[other] { $n } metros cúbicos
    }
    .name = metros cúbicos

unit-acre-feet = ac-pie
    .amount = { $n }{ "\u202F" }ac-pie
    .words = { $n ->
        [one] { $n } acre-pie
       *[other] { $n } acre-pies
    }
    .name = acre-pies

unit-cubic-meters-per-second = m³/s
    .amount = { $n }{ "\u202F" }m³/s
    .words = { $n ->
        [one] { $n } metro cúbico por segundo
       *[other] { $n } metros cúbicos por segundo
    }
    .name = metros cúbicos por segundo

unit-liters-per-second = L/s
    .amount = { $n }{ "\u202F" }L/s
    .words = { $n ->
        [one] { $n } litro por segundo
       *[other] { $n } litros por segundo
    }
    .name = litros por segundo

unit-cubic-feet-per-second = pcs
    .amount = { $n }{ "\u202F" }pcs
    .words = { $n ->
        [one] { $n } pie cúbico por segundo
       *[other] { $n } pies cúbicos por segundo
    }
    .name = pies cúbicos por segundo

unit-hectares = ha
    .amount = { $n }{ "\u202F" }ha
    .words = { $n ->
        [one] { $n } hectárea
       *[other] { $n } hectáreas
    }
    .name = hectáreas

unit-acres = acres
    .amount = { $n ->
        [one] { $n }{ "\u202F" }acre
       *[other] { $n }{ "\u202F" }acres
    }
    .words = { $n ->
        [one] { $n } acre
       *[other] { $n } acres
    }
    .name = acres

unit-square-kilometers = km²
    .amount = { $n }{ "\u202F" }km²
    .words = { $n ->
        [one] { $n } kilómetro cuadrado
       *[other] { $n } kilómetros cuadrados
    }
    .name = kilómetros cuadrados

unit-square-miles = mi²
    .amount = { $n }{ "\u202F" }mi²
    .words = { $n ->
        [one] { $n } milla cuadrada
       *[other] { $n } millas cuadradas
    }
    .name = millas cuadradas

unit-meters = m
    .amount = { $n }{ "\u202F" }m
    .words = { $n ->
        [one] { $n } metro
       *[other] { $n } metros
    }
    .name = metros

unit-feet = pies
    .amount = { $n ->
        [one] { $n }{ "\u202F" }pie
       *[other] { $n }{ "\u202F" }pies
    }
    .words = { $n ->
        [one] { $n } pie
       *[other] { $n } pies
    }
    .name = pies

unit-kilometers = km
    .amount = { $n }{ "\u202F" }km
    .words = { $n ->
        [one] { $n } kilómetro
       *[other] { $n } kilómetros
    }
    .name = kilómetros

unit-miles = mi
    .amount = { $n }{ "\u202F" }mi
    .words = { $n ->
        [one] { $n } milla
       *[other] { $n } millas
    }
    .name = millas

unit-meters-per-second = m/s
    .amount = { $n }{ "\u202F" }m/s
    .words = { $n ->
        [one] { $n } metro por segundo
       *[other] { $n } metros por segundo
    }
    .name = metros por segundo

unit-miles-per-hour = mi/h
    .amount = { $n }{ "\u202F" }mi/h
    .words = { $n ->
        [one] { $n } milla por hora
       *[other] { $n } millas por hora
    }
    .name = millas por hora

# Se dice una vez por página, donde la unidad aparece primero.
unit-acre-feet-meaning = Un acre-pie: agua de un pie de hondo sobre un acre.
unit-cubic-hectometers-meaning = Un hm³: un millón de metros cúbicos.
unit-cubic-feet-per-second-meaning = pcs: pies cúbicos por segundo. En otras hojas dice cfs.
