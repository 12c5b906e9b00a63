# España: solo los nombres que cambian; los demás están en «es».

crop-sudan_grass_hay = Pasto del Sudán
crop-grass_hay = Hierba para heno
crop-pasture_rotated = Prado por turnos
crop-pasture_extensive = Prado abierto
crop-maize_sweet = Maíz dulce
crop-beans_dry = Judía
crop-beans_green = Judía verde
crop-peas_fresh = Guisante verde
crop-peas_dry = Guisante seco
crop-soybean = Soja
crop-potato = Patata
crop-sugar_beet = Remolacha azucarera
crop-table_beet = Remolacha de mesa
crop-sweet_pepper = Pimiento dulce
crop-chile = Pimiento picante
crop-zucchini = Calabacín
crop-apple_bare = Manzano sin hierba
crop-apple_cover = Manzano con hierba
crop-pear_cover = Peral con hierba
crop-cherry_cover = Cerezo con hierba
crop-stone_fruit_bare = Melocotón sin hierba
crop-stone_fruit_cover = Melocotón con hierba
