# Units: the symbol; `amount` with a number (thin gap, never broken); `words` spelled out; `name` in the plural.

unit-celsius = °C
    .amount = { $n }{ "\u202F" }°C
    .words = { $n ->
        [one] { $n } degree Celsius
       *[other] { $n } degrees Celsius
    }
    .name = degrees Celsius

unit-fahrenheit = °F
    .amount = { $n }{ "\u202F" }°F
    .words = { $n ->
        [one] { $n } degree Fahrenheit
       *[other] { $n } degrees Fahrenheit
    }
    .name = degrees Fahrenheit

unit-millimeters = mm
    .amount = { $n }{ "\u202F" }mm
    .words = { $n ->
        [one] { $n } millimeter
       *[other] { $n } millimeters
    }
    .name = millimeters

unit-inches = in
    .amount = { $n }{ "\u202F" }in
    .words = { $n ->
        [one] { $n } inch
       *[other] { $n } inches
    }
    .name = inches

unit-cubic-hectometers = hm³
    .amount = { $n }{ "\u202F" }hm³
    .words = { $n } million cubic meters
    .name = million cubic meters

unit-megaliters = ML
    .amount = { $n }{ "\u202F" }ML
    .words = { $n ->
        [one] { $n } megaliter
       *[other] { $n } megaliters
    }
    .name = megaliters

unit-cubic-meters = m³
    .amount = { $n }{ "\u202F" }m³
    .words = { $n ->
        [one] { $n } cubic meter
       *[other] { $n } cubic meters
    }
    .name = cubic meters

unit-acre-feet = ac-ft
    .amount = { $n }{ "\u202F" }ac-ft
    .words = { $n ->
        [one] { $n } acre-foot
       *[other] { $n } acre-feet
    }
    .name = acre-feet

unit-cubic-meters-per-second = m³/s
    .amount = { $n }{ "\u202F" }m³/s
    .words = { $n ->
        [one] { $n } cubic meter per second
       *[other] { $n } cubic meters per second
    }
    .name = cubic meters per second

unit-liters-per-second = L/s
    .amount = { $n }{ "\u202F" }L/s
    .words = { $n ->
        [one] { $n } liter per second
       *[other] { $n } liters per second
    }
    .name = liters per second

unit-cubic-feet-per-second = cfs
    .amount = { $n }{ "\u202F" }cfs
    .words = { $n ->
        [one] { $n } cubic foot per second
       *[other] { $n } cubic feet per second
    }
    .name = cubic feet per second

unit-hectares = ha
    .amount = { $n }{ "\u202F" }ha
    .words = { $n ->
        [one] { $n } hectare
       *[other] { $n } hectares
    }
    .name = hectares

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
        [one] { $n } square kilometer
       *[other] { $n } square kilometers
    }
    .name = square kilometers

unit-square-miles = sq mi
    .amount = { $n }{ "\u202F" }sq mi
    .words = { $n ->
        [one] { $n } square mile
       *[other] { $n } square miles
    }
    .name = square miles

unit-meters = m
    .amount = { $n }{ "\u202F" }m
    .words = { $n ->
        [one] { $n } meter
       *[other] { $n } meters
    }
    .name = meters

unit-feet = ft
    .amount = { $n }{ "\u202F" }ft
    .words = { $n ->
        [one] { $n } foot
       *[other] { $n } feet
    }
    .name = feet

unit-kilometers = km
    .amount = { $n }{ "\u202F" }km
    .words = { $n ->
        [one] { $n } kilometer
       *[other] { $n } kilometers
    }
    .name = kilometers

unit-miles = mi
    .amount = { $n }{ "\u202F" }mi
    .words = { $n ->
        [one] { $n } mile
       *[other] { $n } miles
    }
    .name = miles

unit-meters-per-second = m/s
    .amount = { $n }{ "\u202F" }m/s
    .words = { $n ->
        [one] { $n } meter per second
       *[other] { $n } meters per second
    }
    .name = meters per second

unit-miles-per-hour = mph
    .amount = { $n }{ "\u202F" }mph
    .words = { $n ->
        [one] { $n } mile per hour
       *[other] { $n } miles per hour
    }
    .name = miles per hour

# Said once on a page, where the unit first appears.
unit-acre-feet-meaning = One acre-foot: water one foot deep over one acre.
unit-cubic-hectometers-meaning = One hm³: one million cubic meters.
unit-cubic-feet-per-second-meaning = cfs: cubic feet per second.
