#include "scenario/losses_reader.hpp"

#include <algorithm>

#include "rainledger/base/cut.hpp"

namespace rainledger {
namespace {

constexpr const char* kLossesExample =
    "write 'losses: impervious', or one law with its parameters, such as 'constant_rate: {rate: "
    "7.5 "
    "mm/h}'";

/// `losses` as a single word: impervious, or what was meant instead.
void check_word_of_losses(const Reading& reading, const Entry& entry) {
    const auto word = read_text(reading, entry, kLossesExample, "a word or a map of one law");
    if (!word) return;
    if (*word == kImpervious) return;
    if (std::ranges::find(kLaws, std::string_view(*word)) != kLaws.end()) {
        reading.error(entry.mark(), "'" + *word + "' needs its parameters",
                      "write 'losses: {" + *word + ": {...}}' with the parameters inside");
        return;
    }
    std::vector<std::string_view> words(kLaws.begin(), kLaws.end());
    words.push_back(kImpervious);
    reading.error(entry.mark(), "losses: " + in_quotes(*word) + " is not a kind of losses",
                  way_out(*word, words));
}

void refuse_unknown_law(const Reading& reading, const Entry& law, const std::string& surface) {
    if (law.key == kImpervious)
        reading.error(law.key_mark, "'impervious' takes no parameters",
                      "write 'losses: impervious'");
    else
        reading.error(law.key_mark,
                      "unknown law " + in_quotes(law.key) + " in the losses of " + surface,
                      way_out(law.key, kLaws));
}

void read_law_of_losses(const Reading& reading, const Entry& entry, const std::string& surface,
                        ReadLosses& read) {
    const std::vector<Entry> laws = entries_of(reading, entry, "the losses of " + surface);
    if (laws.empty()) {
        if (entry.value.size() == 0)
            reading.error(entry.mark(), "the losses of " + surface + " name no law",
                          kLossesExample);
        return;
    }
    read.law = laws.front().key_mark;
    for (const Entry& law : laws) {
        // Of several laws an empty one is no more than one too many.
        if (laws.size() > 1 && law.value.IsNull()) continue;
        if (std::ranges::find(kLaws, std::string_view(law.key)) != kLaws.end()) {
            const auto losses = read_law(reading, law);
            read.is_curve_number = read.is_curve_number || law.key == "curve_number";
            if (losses) read.losses = *losses;
        } else {
            refuse_unknown_law(reading, law, surface);
        }
    }
    if (laws.size() > 1)
        reading.error(laws[1].key_mark,
                      "the losses of " + surface + " name more than one law: " +
                          in_quotes(laws[0].key) + " and " + in_quotes(laws[1].key),
                      "keep one; a surface with two soils is two surfaces");
    if (const YAML::Node law = laws.front().value; law.IsMap())
        if (const YAML::Node observed = law["observed_excess"])
            read.observed_excess = observed.Mark();
}

}  // namespace

ReadLosses read_losses(const Reading& reading, const Entry& entry, const std::string& surface) {
    ReadLosses read;
    read.law = entry.mark();
    read.observed_excess = YAML::Mark::null_mark();
    if (entry.value.IsMap())
        read_law_of_losses(reading, entry, surface, read);
    else
        check_word_of_losses(reading, entry);
    return read;
}

}  // namespace rainledger
