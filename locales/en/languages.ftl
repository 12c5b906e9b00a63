# Languages: what is used when one is missing, and what is wrong with a locale folder.

language-name = English
language-region-unknown = There are no words for { $asked } yet. Words for { $used } are used.
language-unknown = There are no words in the language { $asked } yet. Words for { $used } are used.
language-not-a-tag = “{ $asked }” is not a language. Words for { $used } are used.

locale-unreadable = { $where } cannot be read: { $reason }
locale-too-large = { $where } is too large to be a file of words.
locale-not-a-tag = The folder name { $where } is not a language tag such as fr or es-PE.
locale-syntax = { $where }, line { $line }: this is not a message.
locale-missing = { $where }: the message { $id } is missing. English is used for it.
locale-unknown = { $where }: nothing asks for the message { $id }.
locale-twice = { $where }: the message { $id } is written twice.
locale-arguments = { $where }: the message { $id } takes { $expected }, but here it takes { $found }.
locale-no-arguments = nothing
