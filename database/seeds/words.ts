/** 256 short plain words, so that each stands for eight bits of chance. */
export const WORDS: readonly string[] = (
  'acorn adder alder amber anchor apple apron arch arrow ash aspen attic auger autumn axle badge ' +
  'baker balcony bamboo barge barley barn basin basket beacon beaker beech bellows bench berry birch biscuit ' +
  'bonnet boulder bramble brass bread breeze brick bridge bristle bronze brook broom bucket buckle bugle button ' +
  'cabin candle canoe canvas carrot castle cedar cellar chalk cherry chestnut chimney cider cinder circle clover ' +
  'cobble comet compass copper coral cork cotton cradle cricket crimson crocus cupboard curlew cushion daisy damson ' +
  'dapple dawn deacon delta dinghy dolphin drawer dresser drizzle duster eagle easel ebony elder ember emerald ' +
  'engine fable falcon feather fennel fern ferry fiddle finch flagon flannel flint flour flute forest fountain ' +
  'fossil fox gable galley garden garlic garnet ginger glacier glove goblet goose granite gravel grotto gull ' +
  'hammer hamlet harbour harp hazel heather hedge heron hickory hinge holly honey hoop hornet island ivory ' +
  'ivy jacket jasper jetty jigsaw juniper kettle keystone kiln kitten ladder ladle lagoon lantern larch lark ' +
  'lavender ledge lemon lentil lilac linen lizard lobster locket magnet magpie mallow mantle maple marble meadow ' +
  'melon mitten moss mustard nettle nickel nutmeg oak oatmeal olive onion opal orchard osprey otter oven ' +
  'oxide oyster paddle panther parsley pasture pebble pepper pewter pickle pillow pine plaster plover poplar poppy ' +
  'portal potter prism pumpkin quarry quartz quill quilt rabbit radish rafter raven reed ribbon river robin ' +
  'rocket rowan rudder saddle saffron salmon sandal satin scarf seagull shingle silver sparrow spindle spruce stable ' +
  'teapot temple thimble thistle thunder timber trellis trumpet tulip tunnel turnip velvet walnut willow window zinc'
).split(' ')
