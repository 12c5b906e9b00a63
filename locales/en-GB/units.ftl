# British spelling of the metric units.

unit-millimeters = mm
    .amount = { $n }{ "\u202F" }mm
    .words = { $n ->
        [one] { $n } millimetre
       *[other] { $n } millimetres
    }
    .name = millimetres

unit-cubic-hectometers = hm³
    .amount = { $n }{ "\u202F" }hm³
    .words = { $n } million cubic metres
    .name = million cubic metres

unit-megaliters = ML
    .amount = { $n }{ "\u202F" }ML
    .words = { $n ->
        [one] { $n } megalitre
       *[other] { $n } megalitres
    }
    .name = megalitres

unit-cubic-meters = m³
    .amount = { $n }{ "\u202F" }m³
    .words = { $n ->
        [one] { $n } cubic metre
       *[other] { $n } cubic metres
    }
    .name = cubic metres

unit-cubic-meters-per-second = m³/s
    .amount = { $n }{ "\u202F" }m³/s
    .words = { $n ->
        [one] { $n } cubic metre per second
       *[other] { $n } cubic metres per second
    }
    .name = cubic metres per second

unit-liters-per-second = L/s
    .amount = { $n }{ "\u202F" }L/s
    .words = { $n ->
        [one] { $n } litre per second
       *[other] { $n } litres per second
    }
    .name = litres per second

unit-square-kilometers = km²
    .amount = { $n }{ "\u202F" }km²
    .words = { $n ->
        [one] { $n } square kilometre
       *[other] { $n } square kilometres
    }
    .name = square kilometres

unit-meters = m
    .amount = { $n }{ "\u202F" }m
    .words = { $n ->
        [one] { $n } metre
       *[other] { $n } metres
    }
    .name = metres

unit-kilometers = km
    .amount = { $n }{ "\u202F" }km
    .words = { $n ->
        [one] { $n } kilometre
       *[other] { $n } kilometres
    }
    .name = kilometres

unit-meters-per-second = m/s
    .amount = { $n }{ "\u202F" }m/s
    .words = { $n ->
        [one] { $n } metre per second
       *[other] { $n } metres per second
    }
    .name = metres per second

unit-cubic-hectometers-meaning = One hm³: one million cubic metres.
