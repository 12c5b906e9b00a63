# Safety cautions: the text is for the screen (90 characters at most), `print` for paper, `title` heads it there.
# The first belongs on the opening screen and on every result page; 7 to 10 on an idle kiosk; all on paper.

caution-not-a-forecast = This is a model, not a forecast. It cannot say what next year will bring.
    .title = Not a forecast
    .print = This program is a simple model of a valley. It helps you ask “what if”. It does not know the weather that is coming. For forecasts, use your official water-supply and weather services.

caution-not-for-dam-operation = Never use this to run a dam, a gate or a pump.
    .title = Not for dam operation
    .print = Do not use any number from this program to open, close, fill or empty anything. Dams and gates are run by trained people who follow approved rules for that place.

caution-not-for-floods = It does not warn of floods. In a flood, obey your local emergency service.
    .title = Not for floods
    .print = This program cannot see a flood coming and cannot tell you that you are safe. When water rises, leave low ground and do what your local emergency service says. Never drive or walk through moving water.

caution-not-for-deliveries = It does not set your water. Your district says how much and when.
    .title = Not for deliveries
    .print = A date or an amount on this screen is not a promise of water. Do not plant, sell, borrow or sign because of it. Ask your irrigation district for this year’s delivery plan.

caution-not-for-rights = It proves nothing about water rights. Local law decides.
    .title = Not for legal rights
    .print = The rights in this program are simplified for learning. They do not show who owns, owes or may lose water. Water law changes from place to place. Local law, and the office or court that applies it, decides.

caution-ask-first = Before you act, ask your irrigation district, water master or a licensed engineer.
    .title = Ask first
    .print = Take your question to people who know your river: the irrigation district, the water master, the extension office. For any dam, canal, gate or pipe, hire a licensed engineer.

caution-canals-kill = Canals kill. Fast water, slick sides, no way out. Stay back. Keep children away.
    .title = Canals kill
    .print = Never swim, wade or play in a canal or ditch. The water may look slow and still be strong. Lined walls are slick and you cannot climb out. Gates, pipes and siphons pull people under. Keep children and animals away from the bank.

caution-reservoirs-kill = Reservoirs kill. Cold water, sudden drops, strong pull near gates. Stay clear.
    .title = Reservoirs kill
    .print = Reservoir water can be cold enough to stop a strong swimmer. The bottom drops without warning, and banks can slide when the level falls. Stay away from the dam, the spillway and the outlet. Wear a life jacket in any boat.

caution-spring-ice-kills = Spring ice breaks. Never walk or drive on it, even if it held you last week.
    .title = Spring ice kills
    .print = Melting ice is weak even when it is thick. Ice over moving water, or on a reservoir whose level has dropped, can be hollow. Do not walk, ride or drive on it. Do not send a child or an animal onto it.

caution-someone-falls-in = Someone fell in? Do not jump in. Throw something that floats. Call for help.
    .title = If someone falls in
    .print = Many people die trying to save someone. Stay on firm ground. Call the emergency number. Throw a rope, a jug or a board, or reach with a pole.

caution-electrical-wiring = Wiring can kill. Unplug first. Have a qualified electrician connect the power.
    .title = Electrical wiring
    .print = If you build or repair the kiosk, unplug it before you open it. Keep it dry and away from water tanks. Use a power supply with its safety marks and a grounded outlet with a residual-current (GFCI) switch. Have a qualified electrician do any mains wiring.
