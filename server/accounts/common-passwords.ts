/**
 * Passwords that are tried first: the most frequent ones, in lower case and without the lewd ones, of the list of leaked
 * passwords in the package @zxcvbn-ts/language-common 3.0.4 (MIT licence, (c) 2012-2016 Dan Wheeler and Dropbox, Inc.,
 * (c) 2021 @zxcvbn-ts).
 */
const PASSWORDS = `
password 12345678 123456789 baseball football qwertyuiop 1234567890 superman 1qaz2wsx jennifer trustno1
sunshine iloveyou computer michelle starwars princess 11111111 corvette 1234qwer internet samantha
q1w2e3r4t5 maverick whatever mercedes steelers qwer1234 hardcore q1w2e3r4 midnight bigdaddy victoria
marlboro password1 1q2w3e4r cocacola jordan23 asdfasdf danielle 12344321 jonathan liverpoo qwerty123
passw0rd abcd1234 slipknot scorpion startrek asdfghjkl redskins qazwsxedc liverpool nicholas butthead
dolphins qwertyui metallic mountain benjamin elephant rush2112 1q2w3e4r5t creative garfield asdfghjk
1qazxsw2 december airborne brooklyn godzilla 4815162342 williams darkness blink182 platinum 01012011
11223344 lifehack 12qwaszx snowball nintendo november pakistan explorer redwings 789456123 lasvegas
guinness christin asdf1234 babygirl michigan carolina alexande minecraft metallica kristina kimberly
snickers paradise caroline 147258369 lacrosse bollocks poohbear qweasdzxc einstein drowssap courtney
spitfire patricia maryjane champion svetlana anderson westside security zaq12wsx alexander 123456789a
1232323q scarface qwerty12 marshall veronica stargate 12345qwert semperfi brittany scotland cherokee
simpsons michael1 vladimir franklin infinity passport bulldogs 1234554321 budlight softball fktrcfylh
kawasaki wildcats logitech swordfis motorola alexandr patriots colorado juventus freeuser warcraft
wolverin elizabet valentin mitchell password123 ncc1701d spiderma hello123 virginia pearljam 123qweasd
predator charlie1 panthers peekaboo rolltide american cardinal chevelle fyfcnfcbz loverboy lovelove
123654789 changeme electric darkside hercules lawrence wolfpack letmein1 741852963 spiderman blizzard
cheyenne 123456789q cjkysirj 147852369 sterling basketball a1b2c3d4 airplane billybob stingray chocolat
zeppelin firebird business greenday tarheels 01011980 hellfire engineer serenity fireball 1029384756
remember darkstar mustang1 pavilion bobafett 01012000 dbrnjhbz harrison welcome1 swimming defender
precious icecream swordfish presario rockstar airforce thailand 21122112 bluebird goldfish wrangler
cadillac longhorn microsoft christia qazwsx123 assassin atlantis 123qweasdzxc lonewolf software leonardo
srinivas angelina valentina veronika babydoll butterfly devildog mistress freedom1 soso123aljg montreal
wolfgang 31415926 hotstuff basketba birthday stephani jessica1 testtest kathleen savannah shamrock
deftones goldberg renegade hamilton cristina blahblah enterpri 1234abcd babylon5 sweetpea trfnthbyf
cavalier marathon aardvark butterfl manchester yankees1 napoleon buckeyes 01011990 fredfred highland
1qaz2wsx3edc diamonds campbell chandler drpepper elizabeth 12345678910 thuglife sherlock morpheus
consumer adgjmptw barcelona sundance isabella overlord isabelle ultimate ncc1701e matthew1 geronimo
123qwe123 aleksandr portugal superfly q1w2e3r4t5y6 florence wrinkle1 11235813 51505150 seminole alejandr
concrete access14 margaret christop letmein2 qazxswedc trombone pleasure rhbcnbyf christian cdtnkfyf
stallion mongoose kingkong bluemoon personal a1234567 immortal 123454321 dietcoke anthony1 giovanni
hollywoo morrison 14789632 clifford bonehead fernando ghbdtnbr charlott 1123581321 william1 hongkong
sebastia werewolf super123 cooldude eternity lollipop tottenha stocking anything columbia makaveli
robinson verbatim satan666 standard blackcat punkrock raistlin infantry qwerty12345 waterloo 01012010
seinfeld musicman megadeth skywalke gn56gn56 squirrel wolverine qazwsxed stardust twilight intrepid
vanhalen punisher 1234567a showtime 111222333 skittles ekaterina hannibal thunder1 chelsea1 1q2w3e4r5t6y
portland panasonic sandiego penelope blackdog 1a2b3c4d californ playtime warriors gangster christine
chargers mushroom dingdong crusader stranger dkflbvbh anastasia slapshot guardian 147896325 septembe
angelica scarlett 123321123 kittycat munchkin rammstein 1passwor barcelon santiago blackman starcraft
goodluck coltrane katerina discover spanking shaney14 192837465 lonestar stonecol meridian heather1
25802580 richard1 alexandra zaq1xsw2 beautiful lowrider tacobell 123698745 catalina halflife johnjohn
kangaroo thompson socrates keyboard national formula1 qwerasdf 12369874 penguins vacation ragnarok
asshole1 mailcreated5240 lorraine dodgeram sebastian colombia oblivion sithlord mustangs scoobydo
bigballs zxcv1234 titleist richmond director magnolia blueeyes mersedes 12312312 springer patrick1
martinez cowboys1 nuttertools 1122334455 gateway1 imperial grateful peterpan kingston pa55word freckles
margarita deadhead research mariners rootbeer aspirine frederic children stephanie scooter1 11112222
creampie plymouth justdoit 1234567q lightnin caliente goodtime catherin redalert brucelee porkchop
aquarius raiders1 thankyou fletcher shopping a1s2d3f4 sapphire qwert123 qazwsxedcrfv hastings blackjac
01012001 spectrum chevrole amsterdam diamond1 rosemary candyman beatrice front242 atlantic labrador
123456qwerty syracuse southern commando clitoris 8j4ye3uz monopoly pineappl lesbians gangbang spartans
romashka 123456aa snuggles phoenix1 infiniti jeremiah 1234567890q cosworth charlotte doberman qawsedrf
brandon1 emmanuel webmaster viktoria porsche9 starbuck beefcake godsmack clarence valhalla starfish
sailboat achilles ncc1701a arsenal1 pa55w0rd frontier swingers terminator kentucky jackson1 doughboy
butthole phillies dannyboy nebraska qwertyuio pinkfloy maryland luckydog september oklahoma qwerty123456
agent007 vfrcbvrf nathalie whocares vkontakte ihateyou dilligaf mandingo california technics golfball
01011991 bunghole 15426378 hurrican stripper aberdeen rfnthbyf enterprise dthjybrf handsome excalibu
brothers keystone flamingo passwort lancelot melissa1 australia kamikaze designer pokemon1 somethin
apollo13 bearbear bradford deeznuts warhammer rangers1 blueblue meatball columbus manchest macdaddy
michaela 123456789z sentinel universe truelove billyboy military jamesbon microsof microlab pantyhos
lifetime 01011985 gordon24 theodore function 73501505 passwor1 azsxdcfv 01011970 charlton bigmoney
superstar fordf150 terminal wildfire vladislav hollywood gretchen saratoga 321654987 01011981 greenbay
trinidad chicken1 rjirfrgbde meatloaf hyperion rightnow treasure 01011986 lisalisa chester1 jasmine1
maradona anaconda japanese catherine woofwoof pass1234 poontang christopher albatros richards turkey50
kenworth happy123 dinosaur lionking happyday chickens chocolate ericsson positive crazybab sherwood
polniypizdec0211 fktrcfylhf zxcasdqwe hardrock anhyeuem madeline february abc12345 samsung1 applepie
skywalker gandalf1 davidson skorpion hellyeah australi rockhard hedgehog 13243546 yosemite 1qa2ws3ed
mikemike pooppoop america1 karolina starship 0.0.0.000 salvador greatone football1 78945612 francois
packers1 robotech roadkill backdoor rastaman alliance killbill cinnamon sojdlg123aljg 18436572 963852741
bangbang jeanette operator mechanic amsterda pingpong rasputin marianne majestic passwords kingfish
zxcvbnm1 gotohell wrestlin railroad lineage2 thursday a123456789 peterson phillips nwo4life charles1
kcj9wx5n underdog r2d2c3po snoopdog broadway umbrella splinter chemical 123789456 jamesbond blackhaw
sinclair translator magicman supersta giuseppe caligula shannon1 meredith bullseye saturday kristine
tunafish gfhjkm123 dkflbckfd p0015123 12131415 crawford tazmania deepthroat dfktynbyf tommyboy chainsaw
christina marino13 getmoney budweise qazwsx12 brighton vfhufhbnf mamapapa penthous chrisbln snowboar
undertaker flounder moneyman canadian viewsonic downtown 01011989 qwerty1234 eastside sneakers golfgolf
panasoni chicago1 thanatos ghjcnjnfr whitesox poseidon johannes gargoyle intruder sunnyday ferrari1
solution madison1 newcastl goldstar buckshot 01011988 titanium test1234 federico assholes superman1
sunflowe babyblue westwood apple123 boomboom florida1 motherlode multiplelo callaway starfire paintbal
winston1 123qwerty knickers lokomotiv panther1 thirteen rjycnfynby avalanch philippe 01011984 zerocool
tomorrow godfather original 01011987 newyork1 idontknow vfvfgfgf beerbeer 1x2zkg8w francesc syncmaster
christie zxasqw12 paintball monalisa terrapin spongebob attitude clevelan barefoot chuckles meathead
02071986 cfitymrf cambiami 12345678q 03082006 blessing aleksandra gladiator southpark mazafaka pianoman
casanova traveler hawkeyes clarinet deeznutz 10203040 meowmeow monster1 triangle valencia 01011910
rhiannon crystal1 smeghead andromeda 12345679 cerberus james007 tiberius gabriell salamander resident
hayabusa together juliette 1q2w3e4r5 crjhgbjy nokia6300 rockford goldwing brewster thegreat confused
whiskers spaceman rebecca1 12qw34er gesperrt wrestling mohammed sersolution overkill rhfcjnrf montgom240
bulldog1 something 12345qwe runescape lightning 14725836 19411945 hoosiers recovery 01011992 adrienne
roadking illusion 01091989 medicine leavemealone megatron doghouse 12345678a mortgage heineken fishing1
moonlight 02071982 realmadrid balloons tinkerbell 135792468 babyface 01011975 blackbir bookworm godfathe
seahawks talisman blackjack hawaiian alphabet beautifu 123456654321 mortimer roadrunn password2 charlene
christmas handyman digital1 tiffany1 01011993 dutchess 12301230 wareagle valkyrie idontkno teddybea
dragonball babybaby dolphin1 inuyasha stanford sullivan wishbone property gameover kittykat sinister
02021987 dragon12 friendly aa123456 geoffrey newpass6 katherine claymore 02011985 sporting matthews
checkers 01011977 02041986 gabriela 02081988 alexalex preacher gamecube 02051986 armagedon playstation
z1x2c3v4 02091987 12011987 rhtdtlrj blackout bcfields electron devil666 silverad 02021988 02031986
123456qw thunderb 02101985 ghostrider reynolds cannabis southpar jackson5 absolute lipstick 1234567890a
laurence 02061985 02011987 mandarin baseball1 tottenham kleopatra dirtbike 1357924680 katherin northern
cameltoe bluefish 02021986 slippery 01011983 02091986 qweasd123 mollydog annabell starcraf ghblehjr
vasilisa scorpio1 illinois deadpool farscape sunflower hopeless carpedie asdfzxcv shepherd 02021984
gatorade cameron1 borussia 01011982 flexible graphics fyutkbyf 123qq123 yfcntymrf 02081984 02081987
thedoors 7ugd5hip2j elizaveta 02061986 strength webmaste augustus alejandro argentina corleone vampires
02031984 02021985 21031988 987456321 babylove sergeant dragonba stonecold register buttercu 01020304
01011999 millions millwall patience chrysler bullfrog a12345678 02011986 istanbul ashleigh 02081989
universal binladen shanghai porsche1 gabriel1 jayhawks amateurs barbados nightmare knockers chevrolet
cristian coolness 02041984 criminal hardware bobdylan capslock 02061989 teddybear gfhjkmgfhjkm missouri
carlitos coldbeer netscape andromed brigitte yeahbaby eldorado eastwood monkey12 paranoid rainbow6
soulmate 9293709b13 microphone kakashka 02021983 50spanks fgtkmcby 1234567891 brittney fastball creature
just4fun smashing washington mephisto fountain specialk estrella 02031987 buddyboy 02041983 02051983
piramida 02021989 violetta spencer1 salasana q2w3e4r5 heritage 11221122 browning 02041982 insomnia
budapest pinkfloyd playboy1 sandwich maxwell1 magician wildcard magazine telephon 1234asdf 02081986
1a2s3d4f rochelle pringles iverson3 02041987 02041988 vsjasnel12 darklord loveless radiohea 02011988
reckless jiggaman tiger123 classics hooligan scrabble jellybea hawaii50 pharmacy abnormal concorde
01011979 02081985 qazwsxedc123 islander 02101984 jakejake 02011980 yjdsqgfhjkm kazantip strawberry
maksimka wg8e3wjf 02021982 sweetnes master12 andersen ferguson 123456qwe dynamite gertrude doomsday
rhjrjlbk mariposa killer12 mazda626 excalibur marcello masamune 02071984 12365478 chestnut fullmoon
michael2 02031985 inspiron forsaken snowboard lollypop insanity creation 02061988 katarina moonbeam
gonzalez senators pumpkins windsurf green123 reddevil sheridan rjhjktdf killkill woodland vanguard
aviation stanislav 02081982 02051982 yankees2 sausages francesco anastasiya nevermind presiden faithful
vfitymrf happiness robotics 02011984 highheel firewall polopolo 02031982 evolution drummer1 02061980
pumpkin1 download fandango qwerty11 mypassword earnhard angelika icehouse misfit99 christma zaqxswcde
02061987 02091983 01081989 zxcvbnm123 pineapple harrypotter gorgeous 12051988 qwert12345 vikings1
spongebo broncos1 starstar radiohead viktoriya holidays mckenzie reddwarf dodgers1 05051987 02071987
02101989 02041985 platypus password12 02071980 1z2x3c4v abrakadabra marianna services 02101987 longjohn
134679852 01011900 alessandro honolulu nygiants 02091984 windmill freebird slamdunk snowflak irishman
02091981 bergkamp training warrior1 playstat mudvayne dudedude jackjack johndeer zildjian 02061983
02041981 02091980 22041987 josephin fishbone genesis1 bigblock jefferso clippers chambers thisisit
monkeybo death666 hounddog pallmall 02051988 angel123 02041979 webhompas monsters 02051987 02081977
05051985 02071988 comanche 15051981 26061987 whiteout roadster stefanie heinrich undertak anastasi
festival coolcool qwe123qwe 02031981 mazdarx7 choochoo 08031986 02051989 123456789s iloveyou2 02051984
02061984 kisskiss cbr900rr lovelife chipmunk good123654 bluebell kjrjvjnbd 10011986 11051987 13041988
21031987 washingt tkbpfdtnf smirnoff pipeline james123 fishhead 06061986 konstantin freefree summer99
newcastle krasotka 01031988 02091985 starligh wireless scoobydoo 02021979 koroleva michaels yogibear
redbaron testing1 02021981 nascar24 president 7894561230 highbury zachary1 02061982 username survivor
wanderer soccer12 costello washburn catwoman lemonade bearcats solitude 01011978 02011989 cricket1
slowhand paradigm nostromo borabora arkansas terminat rainbow1 fantasia stephen1 02041989 underground
johnson1 peaches1 cnfybckfd ghbywtccf 02101986 11081989 12021988 13041987 14061991 20061988 21011989
22021989 24061986 30051985 74108520 wildbill gilligan berkeley pool6123 armstron 01061990 tropical
sundevil hurricane volkswag 01011960 02021976 zanzibar mustang6 trouble1 02071981 coventry gtnhjdbx
03041991 45m2do5bs nirvana1 sidekick 02031979 revolver jackass1 cleopatr jermaine gbhfvblf 02081983
marines1 18011987 23041987 everlast tinkerbe bluesman customer 12qw12qw marjorie penguin1 tokiohotel
straight nautilus highlander firefire 02071983 longdong 07071987 threesom asdqwe123 02021973 01121986
ghjcnjgfhjkm 02011981 01071986 02091989 02071989 nokia6233 ghbdtn123 asdfgh01 valentine 10031988 10071987
12121990 13031987 14111986 19061987 19101987 24011985 25081988 28041987 123456123 matthias buddy123
private1 andyod22 complete fredrick fearless antelope marseille pantera1 viewsoni 02081980 02021990
01091987 evangelion handball barselona zxcasdqwe123 sandrine sprinter fyfnjkbq 01041985 02101988 palmtree
sonyericsson 10011990 10051987 10101986 11061985 12121985 13061986 14021985 17051988 20111986 22011988
25800852 28021992 question soccer10 carpente spartan1 pasadena coldplay fairlane elcamino callisto
tomahawk gladiato fantomas castillo honeybee yamahar1 02031989 wildwood 09051945 david123 johngalt
sweetness mcdonald buffalo1 02031980 01121988 02101981 cheshire superior 08121986 ministry trinitro
bismillah capricorn 04041991 vendetta 03041986 02101983 margarit bigpoppa success1 voyager1 iloveyou1
01011995 11051990 16051987 16051989 17061988 20031987 20091991 21031990 22021986 25031987 25121987
27061988 28011987 28021990 29011985 29051989 29071983 30041986 04041988 antonina hetfield cutiepie
nonenone papillon baritone stephane freefall vjqgfhjkm mischief foxylady dominion enforcer leedsutd
f00tball remingto rfvfcenhf 02011983 derparol 02051980 05051989 08051990 02041980 01041988 01061986
cleopatra carnival 01011994 ghjuhfvvf knuckles kayleigh 11121986 12031985 12031987 13121985 15011987
15051990 15101986 18061990 18091985 20051988 20091988 21051991 21101986 22071986 30031988 31011987
02071978 firefigh blowfish 08031985 alexandre whiteboy cromwell minemine dontknow 02011982 wp2003wp
lakeside 123456ru noname123 screamer calimero 02101979 02051985 dfktynby francisc swinging 02041974
cygnusx1 trucking 08081988 obsidian money123 02031988 01031989 01011974 03031986 giovanna sasha_007
02051978 02071979 marijuana 02031977 02051976 kordell1 10101990 13021990 14021986 15021985 16121987
17011987 21051988 22031984 22041988 23021986 24111989 25041988 25091987 26031988 27081990 30041987
07091990 cassandr moonligh blueball bigbooty wrestler building fishfish paramedi capricor 01031985
universa lalakers cherries eclipse1 darkangel whistler smackdow strawber facebook 02051981 01021990
transfer clarissa p@ssw0rd argentin slimshady nokian73 chris123 johncena pictures dogpound 02051973
02041975 10041986 10071988 11021985 13071984 14081985 15071987 17111985 18091986 19011989 19031985
19283746 21011988 21011991 22061988 23031990 24111987 25011990 25091990 31031988 notebook prospect
daylight capetown cartman1 09021988 fortress 01091985 telephone eggplant fussball perfect1 hallo123
pufunga7782 02041978 budweiser marseill goodgirl 02051972 liverpool1 05061990 university vincent1
01031984 02031983 southpaw sylveste forever1 magellan captain1 taekwondo 10081989 11031988 11071988
12041986 12041988 12061988 13011987 13011988 13051987 14011986 14021990 15011985 15041988 16051988
22021988 22071987 22091988 22121987 23021989 23041986 23051985 25101988 30081984 sabrina1 02031978
goldfing 1234zxcv marcius2 pentagon hotgirls cornwall mandrake bubbles1 earthlink 01071987 lakewood
moonshin suburban challeng opendoor 01011976 04041983 commande stanley1 jonathon 08081986 bubba123
02051977 navigator 02081976 hellokitty fkbyjxrf 02091988 07071977 03021986 millenium 07071990 05071984
01041987 gateway2 camaross bluejays 10031987 10101985 10121987 11061991 11121985 12071989 12081985
13061987 14101987 15071986 15071988 16021990 17061989 17101986 18021984 18041986 18051988 18101987
19051987 19061990 19121989 20041986 20081991 20091986 20121989 21061986 22011986 23051990 24031988
26031990 27041990 27061985 27071987 29061990 29071985 30041985 135798642 05071988 whatwhat optimist
02071985 enternow 01051989 03081989 destiny1 hattrick beatles1 natasha1 bordeaux 12345qwer vanessa1
09041987 therock1 ilovegod cardinals marriage espresso 02071975 p4ssw0rd nightwish gsxr1000 23skidoo
ghhh47hj7649 shadow12 speedway 01041992 01041990 09031988 roadrunner ironmaiden supernov toriamos
06041988 patches1 10061986 11051984 11051986 11091989 12041990 12051986 12051990 12121988 14041988
15021990 15051985 15111988 16051985 17041991 20021988 20041988 21061985 22061989 22081986 25071990
25111987 26061985 30011985 mamacita stigmata gonzales 01121987 nineinch waterboy klondike somerset
01031986 mulligan krokodil hardball azertyui republic romantic vauxhall 02061977 06021987 rfntymrf
almighty 06081987 stratfor mississippi houston1 intercourse power123 01021989 lenochka marijuan 02031975
limewire 04041990 blue1234 12345qwerty 01061988 htubcnhfwbz awesome1 funstuff printing 10011983 11011990
14011989 14031988 15021986 16051990 17031987 17071989 18021988 18111987 19061985 20031991 21041992
24031990 24091986 25011986 25061985 27081986 28051987 29051985 29061989 theforce chiquita 05081988
maserati cabernet sheepdog hairball vancouve 02071976 123456789m scheisse montana1 pimpdadd baltimor
mash4077 kirkland riccardo 07051990 02061976 sigmachi revolution dragon69 03041980 absolutely rfhnjirf
05091988 sammy123 colonial 04061986 02101976 q1234567 ilikepie 09021989 toonarmy 01031983 06051986
natalie1 cashmone 02081981 02041977 01021988 11011991 11071985 11081987 12071987 12081984 12101988
13031986 14021987 14071987 15051987 15081991 16011989 16061986 16111990 17071985 18051990 18061985
19071986 19071988 19101990 20031988 21021985 22021985 22041986 22061941 22061987 22071989 22081983
22121983 22121986 23011985 23021985 24061987 24061988 25011985 25041985 25061986 25101989 26021987
27031989 28021985 28051986 myxworld kristian dominiqu darkange scrapper delaware progress gabriele
smoothie slimshad 08071987 q123456789 vqsablpzla pathfind elisabet evolutio 02021980 velocity annmarie
dolemite vagabond woodstoc 02081979 plastics 02021991 08061987 02031973 rachelle billabon ncc74656
austin31 04061991 02021971 nevermore p0o9i8u7 forgetit password9 reginald killer123 02091976 dukeduke
archange minimoni hellsing rocknrol 02041976 03071987 zaqwsxcde morrowind friendster modelsne 03111987
05061986 04041985 02011975 futurama skateboard 10031991 10111986 11081990 11111987 11121987 12011989
12061986 12121982 12121987 13111990 14021983 14051990 14071988 14101988 15011986 15071985 15081988
15091987 16031990 16101987 17041987 17061986 19011987 19051986 19071990 20021986 21041985 21081987
21111985 22021990 22031991 22041985 22061990 23061990 24051990 26031984 26031987 27031987 27091985
29051990 29081985 29081990 29111989 29121987 30121987 31121990 homemade herewego lonesome blackbird
vipergts 123qwert muhammad summer69 jeepster acidburn fireblad pinnacle 03061987 02101977 08041986
jellybean peterbil dilbert1 lighting homework 04051988 fellatio 03031988 baracuda flipflop singapor
04081987 sasha123 02091977 12345abc 05051990 crackers warhamme masterbate starwars1 02091975 01011971
flamengo lfitymrf snowbird 123456789d bradley1 02101980 daughter navyseal 01081990 carebear kamasutra
01061987 02051975 10041983 10061987 10081985 10293847 11011987 11071986 12051985 12101985 13111984
14071986 14881488 15051986 16061985 17011990 17021985 17091987 17101987 18011986 18021986 18041990
19091988 19111987 20011989 20051985 20071986 21071989 21111990 21121986 23011990 23021988 23051986
24011990 24021991 24061992 24121986 25011993 26041986 26041991 26051988 27011988 27051987 28021986
28071986 29011987 31011990 02071971 whiplash rainyday stafford nightmar 03051987 01051988 69camaro
dragonfl stickman 03071986 puppydog 5wr2i7h8 melanie1 apollo11 rockwell vfntvfnbrf eleonora alleycat
ambrosia phialpha exchange lokiloki cartoons 02091973 01051986 contract 03011987 daisydog penetration
06041987 laetitia 03031990 02101978 mustang2 adrenalin goldeney luckyone 06031983 escalade 0192837465
fyutkjxtr 01011973 02071977 02081974 touching trinity1 04091986 charisma 07081986 rainbows 07091982
12345qaz cleveland 02061979 08051987 03031993 10011988 10031989 10041990 10061984 10071985 11071989
11091984 11111986 12011985 12021985 12031988 12051989 12091988 12111990 12121989 12348765 14011987
14011988 14021989 14081988 14121989 15021983 15031988 15061988 15091988 15111984 16011987 16111982
18021987 18031991 19021990 19101986 19111986 20011988 20021985 20031986 20061986 20081986 21051986
21071987 21101989 22051986 22071983 23031987 23051987 23051991 24011987 24071987 24101986 24111990
25021988 26031986 26091986 26101986 26111985 27021991 27111985 28031982 28041992 28061986 28121984
29041985 30011986 30061987 31121987 31121988 369258147 05021988 dragster bismarck cambridg 1michael
treefrog 123456789qwe 06071983 nounours speakers buttercup mallorca alexander1 normandy thumper1 02051979
playball 7777777a wonderful benessere 01021985 smackdown 02051990 trumpet1 asdffdsa 03041987 favorite6
cannibal beethove skipper1 02091971 01051990 nthvbyfnjh malaysia azertyuiop 02091982 rocknroll bynthytn
02011990 pavement 03051986 stockton 06061987 guillaum 10041991 10101989 10121985 10121986 11011989
11041991 11061989 11081988 11101986 12021991 12051987 13021987 13081985 14031989 14041987 14041992
14081990 14091990 15041987 15071983 15081990 15091989 16021987 17021987 17061991 18011988 18041991
18051987 18061991 18081988 18121984 19031987 19091990 20041990 20051989 20061984 21021987 21071992
21081985 22061985 22071990 22081991 22091986 22111985 23061992 23071985 23091987 23121986 24021988
24031987 24041988 24081988 25051985 25121985 26051986 26061986 26071987 27041985 28051985 28051990
28071987 30041991 30051989 30061983 30071986 30111987 789654123 jupiter1 segblue2 abcdefg1 paulpaul
gannibal hallowee ticklish 07071985 offshore allison1 special1 02041973 amethyst letsdoit thrasher
notredam junkmail 09051986 06011988 volleyba liberty1 bettyboo 02061981 02011979 02101973 08011986
06061985 01051985 constant longhair 09081988 alcatraz 01021987 09091986 05021987 mynameis 08071988
sunshine1 04051985 powerful 04061984 sephiroth password01 02061972 computer1 1qazxsw23edc jesus123
05031991 sparkles skinhead sonysony pancakes charlie2 generals montecar 02061974 10011992 10061989
10071990 10081983 10081990 11041990 12071988 12071990 12081983 12081988 12091991 12101984 12101990
12121986 12121991 12211221 13071990 13101987 13121983 14041986 15031990 16031988 16071987 16071991
16091987 16121986 18111986 18121983 18121987 19061992 19091983 20051987 20061990 20101988 20121986
20121988 21031985 21121985 22011985 22051991 22071991 22121989 23031986 23051983 23091986 23111987
24071991 24101989 25081986 26071986 26071989 26101987 27021990 27031986 27061983 28061988 29031988
29061985 29061988 30011987 30031986 30031992 30091989 30121986 31031987 31051985 31101987 1234567899
sergbest 08111984 pathetic auckland 01041980 billbill capitals 02031990 pizzaman delpiero 09111987
1234rewq virginie 04111988 tampabay 1qazzaq1 playboy2 1million vampire1 playmate 08101986 dfcbkbcf
istheman wonderboy montrose cassandra clemente 06031992 dreamcas 05051991 painting 04041987 01071984
zxcvb123 05011987 04061987 lockdown blacklab riffraff fidelity 05111986 08121987 frankie1 07071988
07051987 edmonton 07071982 pressure streaming supernova 02081973 05031990 08051989 justice1 09081985
07071984 02031991 01021992 babycake frederik motocros 01101987 rustydog pinetree 07101987 10031990
10031993 10041987 10051990 10061985 10071986 10091984 11031983 11051988 11071987 12071991 12081987
12081990 12111985 12111991 12131213 13021985 13061985 13071987 14101986 15011983 15061985 15081986
15091985 15111989 15121987 16061987 16061988 16081986 16091988 17021989 17051987 17051989 17051990
18011985 18021992 18031988 18051989 18101985 19021991 19061991 20041985 20061983 20071988 21031984
21061988 22011992 22031986 22051987 22051989 22061984 22071984 22071985 22091991 23061989 23091985
23091989 23111989 24091991 24121987 25031983 25031991 25041991 25051987 25061987 25081985 26081986
27021992 27031992 27111989 28011988 28081986 28081990 28101986 29011982 29061986 29091987 30011990
30051987 31051993 31071990 44332211 66613666 1234509876 feelgood tigercat citation sunlight 02061971
bigtruck 06061981 kingking trooper1 papamama jefferson elements 02031974 02051970 123456as 07071989
password99 popcorn1 04041986 08021990 02021978 05121990 03091983 06021986 02011977 01081985 04071986
01091992 09051987 07041987 francine 05031987 revoluti sniffing chouchou usmarine 03051988 01121990
09091988 01081992 02041972 07101984 07021991 03041983 123456qqq 08081990 03031992 left4dead england1
conquest delldell lol12345 01011972 02061978 07081987 gogators cashmoney 09041986 04071988 02011976
07091988 10021986 10021987 10051988 10081987 10091986 10101980 10101988 11081986 11091985 11091986
12021984 12031990 12061987 12071984 12101989 13031989 13051990 13061991 13071985 13071989 13091984
13101982 13101988 13101992 14051983 14061988 14091987 15011988 15061984 15101991 15121983 16011986
16021988 16031986 16041985 16101986 16121991 17041985 17041986 17061987 17071986 17071987 17111987
17121985 18091987 18121812 18121985 18121990 19041985 19051983 19081987 19111985 20011983 20031985
20031990 20051983 20071984 20101987 21021989 21051990 21091989 21101987 21101988 21111986 22051988
22091984 22091990 22111988 23021983 23021992 23041988 23061987 23091991 24071992 24101984 24101990
24121988 24121989 25021986 25031984 25111991 26031991 26121989 27091991 29041988 30101988 30121985
30121988 31051987 31051991 31121985 31121986 eatmenow 02111987 goodyear 08031987 lunchbox piercing
riversid 01091988 03031984 scissors crescent erection entrance weare138 italiano matchbox acapulco
mohammad lebowski 03031987 surprise loverman abracadabra 03061985 fisherman 01061983 08041985 celebrity
madagaskar dreaming mercury1 01051980 01071990 macintos tennesse hardwood sweetheart 03071985 rhfcfdbwf
ronaldinho masterbating fabulous parlament alpha123 04031991 02011971 naughty1 09031987 03061986 02061990
05051986 05061989 paladin1 asdfg123 06011982 dragonballz 07021980 07061988 rfhfvtkmrf 07041989 09041985
05061988 03101991 07031989 02081970 08081989 10011980 10031980 10041984 10071989 11031986 11041985
11061984 11061986 11061987 11091990 11111991 12021990 12041991 12071992 12081993 12091986 12111984
13041989 13051986 13071982 13081986 13091986 13091988 14031986 15011990 15031991 15051989 15051992
15071990 15081989 16041988 16091990 17051983 17071990 17091985 18031986 18071986 18071989 18071990
18111983 19041986 19071989 19081986 19121988 20031992 20061987 20061991 20081990 21021988 21021990
21031986 21041987 21041991 21101983 21111983 21121989 22071988 22071992 23031983 23041991 23101987
23111986 24041984 24041985 24041986 24051989 24061985 24071990 24101988 24101991 25021985 25041987
25051980 25051988 25071983 25071985 25071987 25091989 25091991 26011986 26011990 26021992 26061989
26061991 26071984 27071988 27111990 28021983 28071985 28121989 29031990 29041989 29051992 30051986
30051988 30061988 31051982 goldeneye interest 07081984 natedogg 09051984 alterego huskers1 adelaide
nineball aircraft 04111991 01041993 mallrats backbone innocent 05041985 freestyle 03061988 zerozero
anonymous laserjet waterman ballsack dangerous ghjcnbnenrf 01031981 information 03091988 07041988
01061992 babybear highlife favorite ljxtymrf 05071985 trinitron supersonic blueberr 05081992 claudia1
demon666 06061988 03041984 tamerlan 1qw23er4 03041989 qwerasdfzxcv 06041984 04071987 flyers88 nokia5800
stewart1 01071988 01041983 05081986 02091978 06101989 humphrey 03031991 cashflow ireland1 implants
08071985 cantona7 bobmarley princesa bendover 04021990 05121988 03011991 sopranos 10021983 10081991
10091985 10101991 11021990 11041986 11041987 11061988 12041987 12081986 12091990 12101986 12121984
13021991 13031991 13061990 13071991 13081987 13091987 14021991 14041991 14051987 14101983 14101991
15031987 15111986 15121985 16011985 16011991 16061990 16111989 17021986 17031992 17111988 17121986
17121987 18011984 18061986 18061987 19011985 19021985 19071983 20011987 20051986 20061980 20101986
21021986 21041990 21091990 21111989 21121988 22041991 22051990 22061991 22091985 22091987 22446688
23021991 23051984 23061985 23071986 23091982 24041990 25051989 25081987 25081989 25091992 26041983
26041988 26051990 26111984 26121987 27061990 27091983 27101987 27101989 28021989 28041988 28051988
28071984 29031982 29041987 29051987 29071986 29081982 29081987 29111987 29111988 29121984 29121988
30061985 30061989 30071992 30101987 31011985 31051986 31081989 31101991 mustang5 hillbill aaaa1111
buster12 carlisle protocol 05061983 01051987 jennifer1 03061984 feathers nemrac58 wonderfu qweasdzxc123
06061990 08021989 annaanna pimpdaddy commander helsinki cyclones macaroni thebeast marauder 09101985
06021989 01041989 02031970 09051990 06091989 02021977 homepage dimadima 03101985 04051987 halloween
07021987 cheerleaers 05041986 soccer11 redheads metallica1 03121986 greywolf 06081986 06081988 06031986
rfhfylfi 08111983 01031980 08061986 06051987 06071984 123456789r reloaded 04061990 04021985 gigabyte
flvbybcnhfnjh dortmund godbless flipper1 jurassic experienced 05101984 love1234 coolhand kcchiefs
09011990 05091987 08071986 barefeet 1111qqqq zoomzoom asdasd123 greedisgood 10011989 10021988 10041989
10051986 10071983 10101987 10111989 11021984 11021987 11021988 11051989 11121990 12031986 12061980
12071982 13021984 13121989 14031990 14051986 14091988 14091989 14111987 14785236 15021991 15031986
15031989 15051991 15081980 16021989 16041986 16051986 17081990 18091984 18101989 19011986 19091986
20021990 20021991 20051984 20111987 21011985 21011990 21041986 21061989 21071990 21081990 21091987
21121987 22031987 22081987 23021984 23061988 24021985 24061984 24081990 25021983 25021984 25111988
26041990 26081983 27011990 27051986 27051991 27061989 27071983 27091984 27091987 28011989 28041983
28051989 28071988 28121990 29011988 29011990 29041984 29041986 29061984 29081988 30081989 30091985
31031990 77347734 1020304050 05081989 nevermin arizona1 alex1234 nopassword 55bgates 123456789987654321
rosewood outsider minnesot 07111987 darthvad 06111986 07041985 06071986 bellagio redlight baberuth
messenger abc123456 copenhag lavalamp culinary beckham7 doughnut trueblue asdfqwer advanced monterey
waterfal bukowski 07061986 05081987 06051983 08081983 bigblack gianluca 02061973 02101975 nokia123
09041990 as123456 06081990 blackhawk 05041990 dtkjcbgtl salvatore davedave 03071984 05041991 kristin1
03021987 01041986 satellite 04021987 05071983 04031982 daredevi duckduck 08021985 03051985 07031986
kamikadze 09061990 03111986 01091986 08081979 biohazard 05071986 05051982 phantom1 1q2q3q4q 06071990
03011986 05041983 07021989 01031991 08011988 deathnote pertinant lilwayne 06111990 blackberry poophead
04061988 08031988 stiletto gallaries 02011978 1234567aa riverrat 04011990 fishtank 04081985 dominique
griffith nightowl 04111989 valeriya 10051989 10111983 10121989 11031987 11031990 11081983 11081984
11081985 11101990 12021987 12061984 12061990 12345677 13031990 13051988 13061989 13081982 13081988
13091990 13101985 13101990 13111985 13111986 13121990 14031985 14061985 14081986 14101989 15031984
15041983 15081984 15101983 15111985 15111987 15121989 16021982 16061984 16071986 16081985 17011985
17011986 17111989 18041983 18041988 18051982 18081989 19101989 20011985 20071985 20111984 20121985
21011986 21051983 21051989 21061987 21071983 21071985 21071986 22081990 22091983 22101988 23021987
23031989 23071988 24011986 24011989 24101987 24121984 24121990 25041983 25041984 25091984 25121986
26011989 26021990 26091985 26121984 26121985 27011983 27011985 27021986 27041987 27121988 28021984
28041986 28061984 28061985 28081985 28121986 28121987 28121988 29031983 29071988 29091990 30041988
30071983 31071986 741258963 qweasdzx topolino buddydog care1839 happyman deadspin eighteen hartford
softtail 04051990 jupiter2 lucky123 04121986 stonewal myspace1 powerman 08081985 qwerty13 prototype
dipstick surveyor atreides chopper1 03021982 z1x2c3v4b5 mastermind 05121985 manunited 05121983 01071989
112233445566 civilwar 05101986 05021989 03081984 downhill dallas22 interacial waterski 01061985 06071988
07011989 03101983 07031988 05051988 01011950 monkeyboy 01041979 07031985 05061987 06031988 dtxyjcnm
01111990 princess1 06111984 01041981 nosferatu 02101974 02091974 09051983 04121987 06031984 06071985
prophecy 02091979 vincenzo pitchers sealteam tortoise integral start123 chewbacc deerhunt greenman
winter99 02021974 09011987 04121985 02081975 10021985 10041982 10081988 10091988 10091989 10111981
10111988 10121979 11041988 11071984 11091983 11111979 11111983 12041985 12071983 12071985 12091987
13021989 13081984 13081990 13121984 14021988 14061982 14071983 14091982 14121986 15021988 15081985
15101987 16021983 16031987 16111987 17021988 17071984 17081988 18011989 19071985 19101982 19101983
19121985 19121986 20041981 20061989 20071981 20091984 21121984 22021984 22081985 23011984 23011988
23011989 23031988 23061983 23081986 24071989 24121985 25011988 25071989 25081983 25091988 26051987
26111987 27051984 27081989 27121986 28031984 28071989 28101988 29011983 29091986 30061986 31011983
31071985 31081985 789632145 1357908642 kikimora nothing1 04051983 03011984 01081980 mike1234 continue
crazyman 08061989 2wsx3edc lapochka 09121983 06071987 wdtnjxtr 05101983 disaster makeitso fivestar
screwyou 123456789v daniella foreplay 02061975 a1a2a3a4 blueberry gizmodo1 01021986 paperino rodrigue
06081985 03101989 libertad 01021980 animated 02081971 eldiablo 04081989 bluestar 08041988 03021989
03031989 07041986 markmark 02081972 01071985 07081989 07071986 04041984 honduras 01051983 volleyball
04011988 pizzahut 03071989 07071980 01061984 q1q2q3q4q5 converse maxpower dragonfly fishcake mississi
seductive ntktdbpjh 03101988 happines badabing 05051980 08091988 03081988 nightwin 01091984 kenneth1
raymond1 02071974 sprocket passmast 10031985 10031986 10051983 10051985 11011980 11031982 11031984
11041983 11071983 11081982 11101985 12011988 12021986 12031989 12041983 12101987 13011981 13011985
13051985 13051989 13061983 13061984 13071983 13121988 14031984 14081989 14101985 14111989 14121987
15031985 15041985 15071984 15091983 16031985 16111983 16121982 16121985 17021982 17091984 17111982
18031981 18051985 18071988 18081986 19021982 19031980 19041987 19061984 19061986 20011984 20031984
20091983 21051985 21091984 21091988 23031985 23081984 23101988 24021986 24021987 24051986 24051987
24071986 24081987 25051984 25071986 25091985 25121982 26011981
`;

/** Shorter ones of the same list: too short to be taken alone, but much used with digits around them. */
const WORDS = `
qwerty dragon monkey letmein shadow master michael mustang jordan qazwsx killer hunter harley zxcvbnm
asdfgh buster andrew batman soccer tigger charlie robert thomas ranger daniel hockey george jessica
asshole pepper klaster zxcvbn freedom joshua maggie ginger amanda ashley cheese nicole summer matthew
chelsea dallas biteme matrix william yankees taylor austin access martin heather thunder merlin secret
diamond hello anthony hammer silver gfhjkm justin patrick richard bailey golfer scooter orange cookie
jackson sparky mickey phoenix bigdog snoopy guitar chicken morgan andrea camaro peanut ferrari cowboy
falcon welcome samsung joseph smokey dakota melissa arsenal boomer eagles tigers marina nascar gateway
porsche yellow monster spider diablo hannah bulldog junior london purple compaq lakers iceman cowboys
money banana boston brandon tennis johnny miller coffee scooby edward nikita mother yamaha brandy barney
chester oliver charles player knight forever steven rangers chicago redsox badboy angel please fender
chris jasper james slayer rabbit natasha rachel marine wizard raiders prince casper fishing flower
crystal jasmine panties iwantu adidas winner winter gandalf enter ghbdtn angela golden lauren winston
madison angels blowme panther spanky shannon sophie johnson david toyota tiger murphy canada blowjob
muffin cooper apples jackie dennis black sandra pokemon carlos qazxsw qwaszx nathan butter rainbow
newyork gemini cameron florida turtle viking booger wilson sierra doctor rocket victor captain bandit
jaguar packers pookie peaches dolphin helpme tucker theman tiffany maxwell jeremy debbie albert maddog
lovers monica united giants nirvana hotdog rosebud warrior stupid success bonnie alexis lucky jason
scorpio samson azerty freddy driver willie calvin sydney gators dexter bubba voodoo happy arthur trouble
america nissan gunner rebecca stella gordon jessie parker apollo eminem legend beavis august apple skippy
buddy qwert kitten magic shelby beaver phantom nothing asdasd xavier braves travis copper tomcat qweqwe
girls bigboy green power animal police online voyager sniper trinity walter blazer heaven lover playboy
bubbles loveme hooters cricket marvin willow donkey topgun saturn family gabriel destiny pumpkin digital
sergey chance private therock runner beatles cassie celtic broncos andrey nelson donald scott eclipse
cartman fluffy louise testing little samuel birdie steve cherry pantera sharon gibson vampire mexico
peter buffalo montana genius flyers maximus school lovely stalker doggie carter spencer speedy barbara
sabrina carmen marcus bronco yankee friends dreams magnum horses goober member qwertyu enigma scotty
pimpin brian surfer sammy genesis racing friend hawaii billy viper october vanessa poopoo stanley walker
stephen simple alaska badger action denise jester drummer forest diesel friday kevin gregory pamela frank
hotrod chevy douglas google shorty tester thumper hitman mozart general reddog music lizard melanie
ruslan vincent eagle sweet teresa olivia buddha spirit frankie antonio liberty natalie mercury naruto
suzuki popcorn spooky marley system claudia kelly kitty vikings death leslie rascal qweasd jimmy loveyou
hummer allison rocky patches russia adrian jupiter penguin howard passion honda vfhbyf andre sandman
homer raider assman fantasy horney domino ironman disney norman bishop francis brutus redrum brooke
bigred jeffrey jesus karina marines digger ireland oksana fireman cougar college alicia russell houston
monday bradley sarah justice super tinker duncan dancer avalon everton reggie molly timothy hentai claire
madonna eugene ducati kermit indian connor galore smooth house titanic boogie simpson arizona saints
georgia asdfg accord baxter denver christ yfnfif smith stinky zachary roland naughty chopper brenda
extreme water skyline zombie froggy pirate fylhtq vision awesome alyssa dreamer bullet empire kirill
people elvis skipper nemesis simon alison arnold daddy psycho danger mookie wanker manutd tommy hobbes
vegeta goblue burton picard bobby windows vfrcbv victory bambam turkey serega tweety hiphop galina
rooster polina berlin taurus ronald avatar raptor maksim spring brazil newport kenneth hendrix madmax
england alpha sublime britney france bigman classic lincoln ronaldo wombat raymond brother kristen
pandora devils simone holiday wildcat horse kramer caesar alabama carrie bondage sports pickle leather
shaggy chronic flowers robbie admin gracie amber perfect kodiak katana sunset crazy maria snowman phpbb
garcia detroit wolves pontiac candy vagina gundam panzer outlaw pretty fisher connie honey trevor redhead
hardon nastya cobra savage service sasha michele lickme white miranda flash harvey oscar strike freddie
beauty bigmac clinton bowling jenny natali future jones wallace apache rulez pyramid dodgers whynot teens
morris trooper cancer packard lucifer popeye weasel raven stewart tanner blonde sandy viktor manager
cheryl norton control wutang julian atlanta spike looking casino paris mouse lennon theone hawkeye hacker
dustin elaine nfnmzyf sailor catfish maxima tattoo barbie light design pervert machine herman rocks
trucks nipples roscoe tornado jerry lights bubble madman orlando pegasus target laura philip browns eatme
stefan cannon dilbert baller winnie katie shooter xfiles qazqaz lesbian street seattle corona amateur
cthutq prelude beach malibu freaky integra pussies dragons iloveu unicorn regina stealth kristin peewee
openup bobcat stacey newton student young enjoy trigger zaqwsx lolita athena shotgun coyote bruins dollar
country joker lestat hottie smiley potter random sweety woody chipper snake samurai video gizmo maddie
valerie flipper express powers cessna teacher goldie moose polaris piglet cookies elena hjvfirf ladies
fatboy scully father single wicked daisy fetish foobar castle tickle bunny pepsi balls transam dfvgbh
impala sunday booty ronnie jasmin gambit toshiba lancer texas hooker knicks roberto stinger benson squirt
trucker redneck alfred blaster siemens shelly manson subaru ibanez blondie casey swinger reaper minnie
mylove harry galaxy lindsay dudley farmer gloria special travel bigone sugar smoke skeeter indiana great
ficken freeman curtis smitty marino joanne bigfoot escort babes check larisa trumpet tristan spartan
babylon asdfghj sister valera stormy paladin andreas hamlet mister rusty seven indigo hornet skater
jerome pierre wonder toronto indians karate julie hesoyam charger sweetie holland chiefs buckeye aurora
griffin brandi redman passwor monika maiden leonard bernie brown garden storm autumn linda millie jungle
pencil tomtom insane pizza timber mariah audrey hamster aragorn pioneer techno catdog lollol triumph
sidney fktrctq sophia island hobbit blabla erotic aaron pascal sampson justme marion stones chrissy tyler
nadine marie goforit burger pitbull kelsey spartak german karen kissme hunting kaiser martha colors
artist harold italia sammie mario nicolas virgin pebbles emerald callie doggy irina racecar germany
goddess change wesley nipple basket joejoe holly poison zipper alpine shirley element huskers marcel
eddie danny christy sakura chichi inside dirty nicola blackie omega watson rommel nikki caserta trojan
philips sergio nugget tarzan bassman warren trixie chicks cream webster sherry manuel dodger anakin
bobbob bomber michel madness loser yvonne fatcat global ybrbnf energy desire soldier bianca warlock
martina andrei larry peace westham harris hector naked ladybug network bernard tintin chuck history
bluesky sherman logan january onelove cotton sunny archie holden brianna vfvjxrf titans lindsey singer
truck smile party missy hansolo angelo joanna natalia beagle phillip panama smiles juice qawsed inferno
connect snatch flatron turbo rocker emily blessed snakes dominic forget finger beetle jamaica alberto
mulder jamie susan passat plastic spunky whiskey monitor cactus ripper spyder markus planet patton exigen
sticky waters nolimit daniela abigail katrina trunks always diana deedee april speed japan mission
pickles million sailing freak holmes delta yomama darren rubber newman faster bertha memphis sylvia
maurice jumper unreal geheim rodney nylons pentium legion shalom kennedy brooks movie dodge dream graham
sprite curious pacific loulou funtime philly ferret niners orion milton cantona kingdom stars africa
office boeing gilbert abgrtyu pirates sheila french sweets palmer monique foster irish jackoff biscuit
drizzt camera fossil moomoo tracey isabel martini salmon shasta jersey maniac snapper nasty solomon
patriot jacob shaved asdzxc dillon gerald twister ricardo cjkywt clayton crimson serena oxford maxmax
denis flight condor silvia biggie maxine ravens teddy colleen bruce wolfman sharks cosmos velvet keeper
foxtrot garrett damien anton sesame banshee sunrise ghost western grendel roxanne privet legolas felix
marlin stone herbert lvbnhbq carrot blades frosty helena brownie groovy penny butler coolio daytona
licker peanuts pikachu trains mollie jericho hershey strider lobster grace bottom ninja murray kansas
shogun goblin search neptune darwin amadeus suzanne oldman bruno showme henry getsome muscle obiwan
support rfrfirf whitney shark maestro danni tanker english tarheel fighter thanks capital newlife anubis
gothic chaos blues cindy sabine roman preston princes brendan slick evelyn python richie tequila devil
clover delete mirage blood surfing bentley potato baggins review porter chubby sooners buffy derrick
harmony fusion mature malcolm allen buttons safety dagger moscow swallow byteme stimpy lucas turner
iverson lester liquid cracker misty nymets robin bigguy mobile tazman nimrod miami bugger marco volume
masters monroe miguel doodle collins powder archer gotcha battle dublin janice charly photos knights
short nookie milano stuart damian grizzly camille scruffy brasil latino poopie lorenzo bananas thegame
world gerard picasso walnut kolobok wisdom trance parrot quality blade auburn dorothy dusty engine
gorilla wheels tamara postal luther carlo cassidy oakland osiris bridge bingo bender annie dookie sally
megaman racerx rjntyjr sirius firefly julia madrid terry griffey women phoebe weezer violet ledzep randy
gangsta ghjcnj paradox loving vertigo carson sergei shiloh sobaka buffett aliens sadie chucky bonjour
sinner stevie trebor finish sprint shazam celica scarlet hoover sommer frances hotboy cynthia formula
rebels elwood melvin bollox lexmark claude rockon tacoma romeo wookie prodigy tempest vfhecz flames
kitkat mystery server molson incubus smoker window rescue carpet lawyer megan celeste melinda wright
jimbob golfing kenny roger bobbie xanadu tardis hearts dixie pooper shaman imagine janine kenwood garbage
topper roberts lizzie ashton elliott oracle sheena chloe mallard shemale mikey asterix
`;

function read(list: string): ReadonlySet<string> {
  return new Set(list.trim().split(/\s+/));
}

/** 4,000 of eight characters or more. */
export const COMMON_PASSWORDS = read(PASSWORDS);
/** 1,500 words of five to seven letters. */
export const COMMON_WORDS = read(WORDS);
