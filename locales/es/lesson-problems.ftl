# Qué puede estar mal en una lección. El mensaje dice qué está mal; .remedy dice cómo queda bien.

problem-lesson-long = Una lección tiene { $most } pasos cuando mucho, y este ya sobra.
    .remedy = Haga dos lecciones.
problem-lesson-text-long = «{ $key }» tiene { $letters } letras en «{ $language }». En la pantalla caben { $most }.
    .remedy = Dígalo con menos palabras, o en dos pasos.
problem-lesson-year = { $near ->
        [0] El registro no tiene el año «{ $value }».
       *[other] El registro no tiene el año «{ $value }». ¿Quiso decir «{ $nearest }»?
    }
    .remedy = Escriba "dry" (seco), "middling" (regular), "wet" (húmedo), "driest" (el más seco), "wettest" (el más húmedo) o un año hidrológico entre { $first } y { $last }.
problem-lesson-dial-absent = Este lugar no tiene la perilla «{ $dial }»; aquí no se puede mostrar este paso.
    .remedy = Quite el paso, o use la lección con un lugar que tenga esa perilla.
problem-lesson-dial-outside = La perilla «{ $dial }» está en { $value }, pero este paso solo permite entre { $least } y { $most }.
    .remedy = Póngala dentro de esos límites, o amplíelos.
problem-lesson-sign = No hay ninguna señal «{ $value }» que leer.
    .remedy = { $near ->
        [0] Aquí se conocen: { $choices }.
       *[other] ¿Quiso decir «{ $nearest }»?
    }
problem-lesson-canal-sign = Los canales no tienen ninguna señal «{ $value }».
    .remedy = { $near ->
        [0] Aquí se conocen: { $choices }.
       *[other] ¿Quiso decir «{ $nearest }»?
    }
problem-lesson-canal = Este lugar no tiene ningún canal «{ $value }».
    .remedy = { $near ->
        [0] Escriba "oldest" (el más antiguo), "newest" (el más reciente), "town" (el pueblo) o la clave de un canal.
       *[other] Escriba "oldest" (el más antiguo), "newest" (el más reciente), "town" (el pueblo) o la clave de un canal. ¿Quiso decir «{ $nearest }»?
    }
problem-lesson-step-unknown = Ningún paso tiene la clave «{ $key }».
    .remedy = { $near ->
        [0] Aquí se conocen: { $choices }. Con "end" se termina la lección.
       *[other] ¿Quiso decir «{ $nearest }»? Con "end" se termina la lección.
    }
problem-lesson-step-back = El paso «{ $key }» no viene después, y una lección solo va hacia adelante.
    .remedy = Nombre un paso que esté más abajo en el archivo.
problem-lesson-unreachable = Ningún paso lleva a «{ $key }»: nadie lo va a ver.
    .remedy = Haga que un paso anterior lleve a él, o quítelo.
problem-lesson-guess-stops = En esta pregunta la perilla tiene { $stops } posiciones. Deben ser entre 2 y { $most }.
    .remedy = Cambie least, most o step.
problem-lesson-usual-outside = Nadie puede dar la respuesta usual { $value }: la perilla va de { $least } a { $most }.
    .remedy = Amplíe los límites de la pregunta.
problem-lesson-guess-nothing = Lo que se pregunta aquí no ocurre en este año.
    .remedy = Elija otro año u otra señal. Si el agua nunca llena el lago, no hay día de llenado.
problem-lesson-guess-range = Nadie puede acertar: el resultado es { $came }, y la perilla va de { $least } a { $most }.
    .remedy = Amplíe los límites de la pregunta.
problem-lesson-usual-right = La lección da por equivocada la respuesta usual, pero el resultado es { $came }, y queda cerca.
    .remedy = Cambie la respuesta usual, o quítela.
problem-lesson-expect-above = Esto debería pasar de { $level }. El resultado es { $came }.
    .remedy = Corrija la lección: lo que enseña no se cumple en este lugar.
problem-lesson-expect-below = Esto debería quedar por debajo de { $level }. El resultado es { $came }.
    .remedy = Corrija la lección: lo que enseña no se cumple en este lugar.
problem-lesson-expect-between = Esto debería quedar entre { $least } y { $most }. El resultado es { $came }.
    .remedy = Corrija la lección: lo que enseña no se cumple en este lugar.
problem-lesson-expect-none = Esto no debería ocurrir. El resultado es { $came }.
    .remedy = Corrija la lección: lo que enseña no se cumple en este lugar.
problem-lesson-expect-nothing = Aquí se esperaba un valor y no hay ninguno: eso no ocurre en este año.
    .remedy = Corrija la lección. Si lo correcto es que no haya ninguno, escriba is = "none".
