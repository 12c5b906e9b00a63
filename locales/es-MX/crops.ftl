# México: solo los nombres que cambian; los demás están en «es».

crop-turf = Pasto de jardín
crop-tomato = Jitomate
