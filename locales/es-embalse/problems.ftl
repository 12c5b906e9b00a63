# Donde se dice embalse y no presa.

problem-storage-shares = Las partes del embalse suman { $total } %.
    .remedy = Entre todas pueden sumar 100 % como máximo. Lo que sobra es de todos.
problem-share-without-reservoir = «{ $key }» tiene una parte del embalse, y el lugar no tiene embalse.
    .remedy = Quite esa parte, o describa el embalse en [reservoir].
