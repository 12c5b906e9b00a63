# Avisos de seguridad: el texto va en pantalla (90 letras o menos), `print` en papel, `title` lo encabeza.
# El primero va en la pantalla de inicio y con cada resultado; del 7 al 10 en la pantalla sola; todos en papel.

caution-not-a-forecast = Esto es un modelo, no un pronóstico. No dice cómo vendrá el próximo año.
    .title = No es un pronóstico
    .print = Este programa es un modelo sencillo de un valle. Sirve para preguntar «¿y si…?». No sabe qué tiempo viene. Para pronósticos, consulte los servicios oficiales del agua y del tiempo.

caution-not-for-dam-operation = No lo use nunca para manejar una presa, una compuerta o una bomba.
    .title = No es para manejar presas
    .print = No use ningún número de este programa para abrir, cerrar, llenar o vaciar nada. Las presas y compuertas las maneja personal capacitado, con reglas aprobadas para ese lugar.

caution-not-for-floods = No avisa de crecidas. Si hay crecida, siga a protección civil o emergencias de su zona.
    .title = No es para crecidas
    .print = Este programa no ve venir una crecida ni puede decirle que está a salvo. Si sube el agua, deje las partes bajas y haga lo que indiquen protección civil o los servicios de emergencia. No cruce agua en movimiento, ni a pie ni en vehículo.

caution-not-for-deliveries = No fija su agua. Su distrito le dice cuánta le toca y cuándo.
    .title = No es para entregas
    .print = Una fecha o una cantidad en esta pantalla no es una promesa de agua. No siembre, venda, pida prestado ni firme por lo que vea aquí. Pida a su distrito de riego el plan de entregas de este año.

caution-not-for-rights = No prueba nada sobre derechos de agua. Decide la ley local.
    .title = No es para derechos
    .print = Los derechos de este programa están simplificados para aprender. No muestran quién tiene, debe o puede perder agua. La ley de aguas cambia de un lugar a otro. Deciden la ley local y la oficina o el tribunal que la aplica.

caution-ask-first = Antes de actuar, pregunte al distrito, a quien reparte el agua o a un ingeniero titulado.
    .title = Pregunte antes
    .print = Lleve su pregunta a quienes conocen su río: el distrito de riego, la persona que reparte el agua, la oficina de extensión. Para cualquier presa, canal, compuerta o tubería, contrate a un ingeniero titulado o una ingeniera titulada, con licencia.

caution-canals-kill = Los canales matan: agua rápida, paredes lisas, sin salida. Aléjese y cuide a los niños.
    .title = Los canales matan
    .print = No nade, no se meta ni juegue en un canal o acequia. El agua puede parecer mansa y traer mucha fuerza. Las paredes revestidas son lisas y no hay de dónde agarrarse. Las compuertas, los tubos y los sifones jalan hacia abajo. Mantenga lejos de la orilla a niños y animales.

caution-reservoirs-kill = Las presas matan: agua fría, fondo disparejo, jalón en las compuertas. No se acerque.
    .title = Las presas matan
    .print = El agua de una presa puede estar tan fría que vence a quien nada bien. El fondo baja de golpe y la orilla puede derrumbarse cuando baja el nivel. No se acerque a la cortina, al vertedor ni a la toma. En lancha, use siempre chaleco salvavidas.

caution-spring-ice-kills = El hielo de primavera se rompe. No lo pise ni lo cruce, aunque antes haya aguantado.
    .title = El hielo de primavera mata
    .print = El hielo que se está derritiendo es débil aunque se vea grueso. Sobre agua que corre, o en una presa a la que le bajó el nivel, puede estar hueco. No camine ni pase en vehículo sobre él. No deje que suban niños ni animales.

caution-someone-falls-in = ¿Alguien cayó? No se tire. Lance algo que flote y pida auxilio.
    .title = Si alguien cae al agua
    .print = Muchas personas mueren por querer salvar a otra. Quédese en tierra firme. Llame al número de emergencia. Lance una cuerda, un bidón o una tabla, o alcance con una vara.

caution-electrical-wiring = La corriente mata. Desconecte primero. Que conecte la luz un electricista calificado.
    .title = Instalación eléctrica
    .print = Si arma o repara el módulo de pantalla, desconéctelo antes de abrirlo. Manténgalo seco y lejos de depósitos de agua. Use una fuente con sus marcas de seguridad y un contacto con tierra e interruptor diferencial (GFCI). La instalación a la red eléctrica debe hacerla una persona electricista calificada.
