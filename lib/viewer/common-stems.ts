const list = (text: string): string[] => text.trim().split(/\s+/);

/** Words that leaked passwords are built on most often; from memory of published rankings, without their numbers and years. */
export const COMMON_WORDS = list(`
password passwort passw0rd pass passwd parola contrasena senha motdepasse wachtwoord heslo haslo salasana
welcome letmein login admin administrator root user guest test tester testing default changeme secret master access server
system computer internet network windows android google yahoo facebook youtube twitter instagram linkedin microsoft apple samsung
nokia sony playstation nintendo xbox iphone hotmail gmail qwerty qwertz azerty asdfgh zxcvbn abc abcd abcdef
love ilove iloveyou loveyou loveme lovely lover sweet sweetie sweetheart honey baby babygirl babyboy angel angels princess queen king
prince star superstar sunshine sunny moonlight rainbow butterfly flower flowers rose lily daisy violet orchid sunflower
monkey dragon tiger lion bear panda eagle falcon hawk wolf shark dolphin turtle rabbit bunny kitty kitten puppy doggie horse
pony spider snake scorpion phoenix unicorn bulldog bulldogs chicken turkey penguin elephant giraffe
football baseball basketball softball soccer hockey tennis golf golfer cricket rugby volleyball wrestling boxing swimming running
fishing hunting hunter racing racer biker skater surfer snowboard gymnast cheerleader dancer
liverpool arsenal chelsea manchester united barcelona realmadrid juventus milan bayern celtic rangers everton tottenham
yankees redsox dodgers giants cowboys steelers packers raiders broncos patriots eagles dolphins lakers bulls celtics knicks
ferrari porsche mercedes mustang corvette camaro chevrolet chevy honda toyota nissan suzuki yamaha kawasaki harley davidson
batman superman spiderman ironman captain hulk joker robin starwars startrek skywalker yoda vader hobbit gandalf harry potter
pokemon pikachu naruto mario sonic zelda minecraft fortnite roblox warcraft counterstrike halo matrix terminator
shadow ghost killer hunter warrior knight ninja samurai pirate soldier sniper marine army navy ranger trooper police cowboy
hello goodbye whatever nothing something anything everything trustno blessed blessing jesus christ jesuschrist god faith hope
heaven freedom liberty justice peace happy happiness smile lucky forever family friend friends bestfriend together mother father
mommy daddy mom dad sister brother grandma
summer winter spring autumn january february march april june july august september october november december
monday tuesday wednesday thursday friday saturday sunday birthday christmas holiday vacation
london paris berlin madrid rome moscow newyork chicago boston dallas houston denver phoenix seattle austin texas florida
california america canada mexico brazil england ireland scotland germany france spain italy russia china india australia
red blue green yellow orange purple pink black white silver gold golden diamond crystal ruby emerald sapphire pearl
chocolate cookie candy sugar cherry banana strawberry pepper ginger pumpkin peanut cheese coffee pizza burger bacon
guitar piano music rock rocknroll metal metallica nirvana slipknot eminem beatles elvis madonna
money dollar million business company office manager boss work sales support service security
school student teacher college university science library
soleil bonjour doudou amour chouchou loulou hallo schatz liebe hola teamo amor princesa estrella querida contrasenya
internet123 blink midnight thunder lightning storm tornado hurricane snow winter ice fire firefly flame inferno
jordan cooper maverick ranger pepper buster charlie bailey max maggie molly sadie tucker lucky rocky bandit smokey shadow
purple precious beautiful gorgeous handsome sexy hottie cutie cool awesome amazing fantastic super mega ultra power magic
letme open opensesame sesame mypassword thepassword newpassword oldpassword nopassword
`);

/** Given names that leaked passwords are built on most often; from memory of the same rankings. */
export const COMMON_NAMES = list(`
michael jennifer jessica ashley amanda daniel andrew joshua matthew anthony christopher nicholas alexander jonathan benjamin
samantha stephanie nicole melissa elizabeth danielle michelle rebecca rachel lauren heather victoria kimberly vanessa natalie
thomas robert william richard charles george edward henry james john david mark paul peter steven kevin brian jason justin
brandon tyler austin zachary jacob ethan dylan logan hunter connor patrick timothy gregory jeffrey scott eric adam sean ryan
sarah emily hannah madison olivia sophia isabella chloe grace megan amber crystal brittany courtney tiffany alyssa kayla
maria anna laura julia andrea angela barbara patricia sandra carolina daniela gabriela valentina alejandra fernanda mariana
carlos miguel alejandro francisco fernando antonio ricardo eduardo roberto sebastian santiago diego javier
martin stefan thomas andreas christian florian tobias sabine claudia monika martina
alexis morgan taylor jasmine sabrina monica veronica katherine caroline christine diana natasha tatiana
marie pierre nicolas camille julien mathieu celine
ahmed mohammed mohamed ali fatima ibrahim omar yusuf priya rahul deepak sanjay krishna ganesh
`);

/** Words tied to this product and its trade: each user's first idea here, and so a guesser's. */
export const CONTEXT_WORDS = list(`
towfolio folio locomotive locomotives locomotief lokomotive railroad railroads railway railways train trains railcar deadintow
boxcar caboose diesel engine engineer conductor switcher casefile waybill interchange carrier inspector contractor
`);
