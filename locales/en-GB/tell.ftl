# Words of Britain.

tell-less-than-a-liter = less than a litre
