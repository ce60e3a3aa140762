/**
 * Passwords that are tried first, in lower case, eight characters and longer: shorter ones cannot be chosen at all, but
 * these may be the start of a longer one with digits or signs after it.
 */
export const commonPasswords: ReadonlySet<string> = new Set(`
  password password1 password12 password123 password1234 password12345 passw0rd p@ssword p@ssw0rd p@ssw0rd1 pa55word passwords mypassword yourpassword
  newpassword oldpassword thepassword passwort passwort1 passwort123 motdepasse contraseña contrasena wachtwoord wachtwoord1 password! password1!
  password123! passwordpassword letmein1 letmein123 letmeinnow letmeinplease welcome1 welcome12 welcome123 welcome2024 welcome2025 welcome2026
  welcomeback welcomehome changeme changeme1 changeme123 changemenow changeit temporary temporary1 temppass temppassword default1 defaultpassword
  initial1 initialpassword firstpassword secret123 secretpassword supersecret topsecret topsecret1 nopassword administrator administrator1 admin123
  admin1234 admin12345 admin123456 adminadmin adminpassword superadmin sysadmin1 rootroot rootpassword guestguest testtest testtest1 test1234 test12345
  testing123 testpassword demodemo demo1234 demopassword useruser user1234 operator1 manager1 manager123 technician technician1 supervisor supervisor1
  12345678 123456789 1234567890 12345678910 123456789012 0123456789 0987654321 987654321 87654321 11111111 111111111111 00000000 000000000000 22222222
  88888888 99999999 12341234 123412341234 123123123 123123123123 121212121212 112233445566 123321123321 147258369 147258369147 159753159753 741852963
  789456123 789456123789 1qaz2wsx 1qaz2wsx3edc 1q2w3e4r 1q2w3e4r5t 1q2w3e4r5t6y q1w2e3r4 q1w2e3r4t5 q1w2e3r4t5y6 zaq12wsx zaq1xsw2 zaq12wsxcde3 1234qwer
  1234qwerasdf qwer1234 qwer1234asdf asdf1234 asdfasdf asdfghjk asdfghjkl asdfghjkl1 asdfqwer zxcvbnm1 zxcvbnm123 zxcvasdfqwer qwertyui qwertyuiop
  qwertyuiop1 qwertyuiop123 qwerty12 qwerty123 qwerty1234 qwerty12345 qwerty123456 qwerty123456789 qwertz123 qwertzuiop azertyuiop azerty123 123qweasd
  123qweasdzxc qweasdzxc qweasdzxc123 qazwsxedc qazwsxedcrfv qazwsx123 abcd1234 abc12345 abc123456 abcdefgh abcdefghij abcdefghijkl abc123abc123
  a1b2c3d4 a1b2c3d4e5 a1b2c3d4e5f6 aa123456 a123456789 a1234567890 aaaaaaaa aaaaaaaaaaaa iloveyou iloveyou1 iloveyou12 iloveyou123 iloveyou2
  iloveyouforever ilovemyself iloveyousomuch iloveyoubaby loveyou1 lovelove loveme123 lovely123 iloveu123 ihateyou ihateyou1 ihatepasswords ilovecats
  ilovedogs mylovemylove babygirl babygirl1 babygirl123 sweetheart sweetheart1 sweetie1 darling1 honeybee princess princess1 princess12 princess123
  prettygirl beautiful beautiful1 gorgeous butterfly butterfly1 butterfly123 sunshine sunshine1 sunshine12 sunshine123 moonlight moonlight1 starlight
  rainbow1 rainbow123 flower123 chocolate chocolate1 chocolate123 strawberry strawberry1 blueberry cupcake1 cinnamon cheesecake icecream1 pumpkin1
  cookie123 cookies1 football football1 football12 football123 baseball baseball1 baseball123 basketball basketball1 softball1 volleyball hockey123
  soccer123 liverpool liverpool1 liverpool123 liverpoolfc manchester manchester1 manchesterunited arsenal1 arsenal123 chelsea1 chelsea123 chelseafc
  everton1 tottenham tottenham1 newcastle newcastle1 barcelona barcelona1 realmadrid juventus1 cricket1 yankees1 cowboys1 steelers1 lakers24 michael1
  michael123 jennifer jennifer1 jessica1 jessica123 michelle michelle1 charlotte charlotte1 elizabeth elizabeth1 christopher jonathan1 alexander
  alexander1 alexandra victoria1 samantha samantha1 stephanie nicholas1 matthew1 benjamin1 william1 daniel123 charlie1 charlie123 thomas123 george123
  jordan23 jordan123 ashley123 nicole123 andrea123 superman superman1 superman123 spiderman spiderman1 batman123 batmanbatman wolverine ironman123
  captainamerica starwars starwars1 starwars123 startrek1 harrypotter harrypotter1 hogwarts1 gandalf1 pokemon1 pokemon123 pikachu1 pikachu123 minecraft
  minecraft1 minecraft123 nintendo1 playstation playstation1 xbox3600 fortnite1 mustang1 mustang123 corvette1 corvette ferrari1 ferrari123 porsche911
  mercedes mercedes1 mercedesbenz yamaha123 harley123 harleydavidson motorcycle computer computer1 computer123 internet internet1 internet123 microsoft
  microsoft1 windows10 windows123 google123 facebook facebook1 facebook123 linkedin1 youtube123 whatsapp1 samsung1 samsung123 iphone123 blackberry
  matrix123 trustno1 trustno1trustno1 whatever whatever1 whatever123 nothing1 nothing123 letmeletme dragon123 dragonball dragonballz master123
  mastermaster monkey123 monkeymonkey shadow123 tigger123 hunter123 killer123 ranger123 buster123 pepper123 ginger123 maggie123 snoopy123 scooby123
  fuckyou1 fuckyou123 fuckoff1 asshole1 bullshit jesus123 jesuschrist jesusislord godisgood godbless1 blessed1 heaven123 angel123 angels123 devil666
  freedom1 freedom123 forever1 forever123 together happiness happyday happy123 smile123 lucky123 lucky777 money123 million1 diamond1 golden123 silver123
  platinum phoenix1 thunder1 lightning hurricane tornado1 december1 november1 october1 september september1 february january1 summer123 summer2024
  summer2025 summer2026 winter123 winter2024 winter2025 winter2026 spring123 spring2025 spring2026 autumn123 autumn2025 autumn2026 monday123 friday123
  saturday1 sunday123 birthday birthday1 christmas christmas1 halloween1 valentine england1 england123 scotland scotland1 germany1 deutschland australia
  australia1 california california1 newyork1 newyorkcity london123 londonlondon paris123 hello123 hello1234 hellohello hello123456 helloworld
  helloworld1 helloworld123 goodbye1 goodmorning goodluck1 comeon123 opensesame opensesame1 letmeintoday abracadabra access123 accessgranted security
  security1 security123 computerscience correcthorsebatterystaple thisismypassword thisisapassword ilovemypassword passwordispassword mynameismike
  whatsyourname donotenter keepout123 enterenter enter123 sesame123 company1 company123 office123 office2025 business1 laboratory laboratory1 testing1
  testing1234 quality1 quality123 workwork production production1 engineer engineer1 engineering metallurgy metallurgist microscope foundry123
  steelworks factory123 workshop1
`.trim().split(/\s+/))
