# Chile: solo los nombres que cambian; los demás están en «es».

crop-sudan_grass_hay = Pasto sudán
crop-pasture_rotated = Pradera por turnos
crop-pasture_extensive = Pradera abierta
crop-maize_sweet = Choclo
crop-beans_dry = Poroto
crop-beans_green = Poroto verde
crop-peas_fresh = Arveja verde
crop-peas_dry = Arveja seca
crop-sugar_beet = Remolacha azucarera
crop-table_beet = Betarraga
crop-sweet_pepper = Pimentón
crop-chile = Ají
crop-zucchini = Zapallo italiano
crop-winter_squash = Zapallo
crop-grape_wine = Viña
