lesson-years-filled = Años en que se llena el embalse
    .short = Años lleno
    .plain = En cuántos años del registro se llenó el embalse.
