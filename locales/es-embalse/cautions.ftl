# Oraciones completas para donde el lago se llama embalse, y la pared, muro.

caution-not-for-dam-operation = No lo use nunca para manejar un embalse, una compuerta o una bomba.
    .title = No es para manejar embalses
    .print = No use ningún número de este programa para abrir, cerrar, llenar o vaciar nada. Los embalses y compuertas los maneja personal capacitado, con reglas aprobadas para ese lugar.
caution-ask-first = Antes de actuar, pregunte al distrito, a quien reparte el agua o a un ingeniero titulado.
    .title = Pregunte antes
    .print = Lleve su pregunta a quienes conocen su río: el distrito de riego, la persona que reparte el agua, la oficina de extensión. Para cualquier embalse, canal, compuerta o tubería, contrate a un ingeniero titulado o una ingeniera titulada, con licencia.
caution-canals-kill = Los canales matan: agua rápida, paredes lisas, sin salida. Aléjese y cuide a los niños.
    .title = Los canales matan
    .print = No nade, no se meta ni juegue en un canal o acequia. El agua puede parecer mansa y traer mucha fuerza. Las paredes revestidas son lisas y no hay de dónde agarrarse. Las compuertas, los tubos y los sifones tiran hacia abajo. Mantenga lejos de la orilla a niños y animales.
caution-reservoirs-kill = Los embalses matan: agua fría, fondo disparejo, tirón en las compuertas. No se acerque.
    .title = Los embalses matan
    .print = El agua de un embalse puede estar tan fría que vence a quien nada bien. El fondo baja de golpe y la orilla puede derrumbarse cuando baja el nivel. No se acerque al muro, al vertedero ni a la toma. En lancha, use siempre chaleco salvavidas.
caution-spring-ice-kills = El hielo de primavera se rompe. No lo pise ni lo cruce, aunque antes haya aguantado.
    .title = El hielo de primavera mata
    .print = El hielo que se está derritiendo es débil aunque se vea grueso. Sobre agua que corre, o en un embalse al que le bajó el nivel, puede estar hueco. No camine ni pase en vehículo sobre él. No deje que suban niños ni animales.
caution-electrical-wiring = La corriente mata. Desconecte primero. Que conecte la luz un electricista calificado.
    .title = Instalación eléctrica
    .print = Si arma o repara el módulo de pantalla, desconéctelo antes de abrirlo. Manténgalo seco y lejos de depósitos de agua. Use una fuente con sus marcas de seguridad y un enchufe con toma de tierra e interruptor diferencial (GFCI). La instalación a la red eléctrica debe hacerla una persona electricista calificada.
