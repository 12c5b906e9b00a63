# Idiomas: qué se usa cuando falta uno, y qué tiene mal una carpeta de palabras.

language-name = Español
language-region-unknown = Todavía no hay palabras para { $asked }. Se usan las de { $used }.
language-unknown = Todavía no hay palabras en el idioma { $asked }. Se usan las de { $used }.
language-not-a-tag = «{ $asked }» no es un idioma. Se usan las palabras de { $used }.

locale-unreadable = No se puede leer { $where }: { $reason }
locale-too-large = { $where } es demasiado grande para ser un archivo de palabras.
locale-not-a-tag = El nombre de carpeta { $where } no es una etiqueta de idioma, como fr o es-PE.
locale-syntax = { $where }, renglón { $line }: esto no es un mensaje.
locale-missing = { $where }: falta el mensaje { $id }. En su lugar sale en inglés.
locale-unknown = { $where }: nadie pide el mensaje { $id }.
locale-twice = { $where }: el mensaje { $id } está dos veces.
locale-arguments = { $where }: el mensaje { $id } lleva { $expected }, pero aquí lleva { $found }.
locale-no-arguments = nada
