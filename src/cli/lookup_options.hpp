#pragma once

#include <array>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "cli/arguments.hpp"
#include "cli/run_files.hpp"
#include "rainledger/report/lookup_topics.hpp"

namespace rainledger {

inline constexpr std::array kLookupOptions{
    OptionRow{"condition", "WORD", "cover: hydrologic condition good, fair or poor"},
    OptionRow{"treatment", "NAME", "cover: of cultivated land, such as contoured"},
    OptionRow{"soil-group", "GROUP", "cover: A, B, C, D, or A/D, B/D, C/D; picks the number"},
    OptionRow{"impervious", "SHARE", "cover: composite number of an area so impervious ('25 %')"},
    OptionRow{"connected", "SHARE", "cover: share of the impervious part that drains directly"},
    OptionRow{"saturation", "SHARE",
              "soil, texture: effective saturation before the storm ('40 %'),\n"
              "which fills in the moisture deficit"},
    OptionRow{"sand", "PERCENT", "texture: sand by weight, such as 42"},
    OptionRow{"clay", "PERCENT", "texture: clay by weight; silt is the rest"},
    OptionRow{"organic", "PERCENT", "texture: organic matter by weight (2.5 unless given)"},
    OptionRow{"porosity", "SHARE", "texture: total porosity (the mean of the class unless given)"},
    OptionRow{"conductivity", "RATE", "soil-group: saturated, of the layer that transmits least"},
    OptionRow{"impermeable-layer", "DEPTH", "soil-group: depth down to one ('1.2 m')"},
    OptionRow{"water-table", "DEPTH", "soil-group: depth of its highest level in a year"},
    OptionRow{"slope", "SHARE", "storage: depression storage of pavement so steep ('2 %')"},
    OptionRow{"rain", "DEPTH", "interception: depth of the storm ('30 mm')"},
    OptionRow{"height", "DEPTH", "interception: height of a crop ('1.2 m')"},
    OptionRow{"json", "FILE",
              "the same for programs (mm, mm/h, 1/h); '-' writes it to standard\n"
              "output in place of the text"},
    OptionRow{"units", "mm|in", "units of the text: mm and mm/h (the default), or in and in/h"},
    OptionRow{"quiet", "", "no notes on standard error"},
};

/// A topic: how it is called, and who answers.
struct LookupTopic {
    std::string_view name;
    std::string_view takes;  ///< "[NAME]", "CN"
    std::string_view text;
    std::string_view options;  ///< names of those that go with it, a blank between
    LookupAnswer (*look_up)(const LookupAsked&);
};

inline constexpr std::array kLookupTopics{
    LookupTopic{"soil", "[NAME]", "Green-Ampt parameters and soil water by texture class",
                "saturation", look_up_soil},
    LookupTopic{"texture", "", "class and parameters from sand, clay and organic matter",
                "sand clay organic porosity saturation", look_up_texture},
    LookupTopic{"cover", "[NAME]", "curve numbers by cover, condition and soil group; composites",
                "condition treatment soil-group impervious connected", look_up_cover},
    LookupTopic{"soil-group", "[TEXTURE]", "hydrologic soil group from conductivity and depths",
                "conductivity impermeable-layer water-table", look_up_soil_group},
    LookupTopic{"antecedent", "[NUMBER]", "a curve number in antecedent conditions I and III", "",
                look_up_antecedent},
    LookupTopic{"horton", "[NAME]", "Horton's parameters by soil and cover", "", look_up_horton},
    LookupTopic{"storage", "[NAME]", "depression storage and surface retention", "slope",
                look_up_storage},
    LookupTopic{"interception", "[NAME]", "interception by plants, in a storm of a depth",
                "rain height", look_up_interception},
    LookupTopic{"steady-rate", "[NAME]", "typical steady infiltration rates, to judge a test by",
                "", look_up_steady_rate},
};

/// What `rainledger lookup` was asked to do.
struct LookupOptions {
    const LookupTopic* topic = nullptr;  ///< null asks for the list of topics
    LookupAsked asked;
    std::optional<std::string> json;  ///< path; "-" for standard output
    bool quiet = false;

    /// The files to write.
    [[nodiscard]] std::vector<Output> outputs() const;
};

/// Reads the words after `lookup`. Nothing with `problem`, one line, when they are wrong.
[[nodiscard]] std::optional<LookupOptions> read_lookup_options(std::span<const std::string> given,
                                                               std::string& problem);

/// The topics, a line each.
[[nodiscard]] std::string topic_lines();

}  // namespace rainledger
