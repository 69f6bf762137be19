#include "scenario/yaml_document.hpp"

#include <array>
#include <string>
#include <string_view>
#include <vector>

namespace rainledger {
namespace {

struct PlainWords {
    std::string_view parser;
    std::string_view plain;
};

/// What the YAML library's messages mean to somebody who has never heard of flows and anchors.
constexpr auto kPlainWords = std::to_array<PlainWords>({
    {"illegal map value", "this colon follows nothing that can be a key"},
    {"illegal map key", "no key can stand here"},
    {"illegal block entry", "no list entry can stand here"},
    {"illegal flow end", "this closing bracket has no opening one"},
    {"end of sequence flow not found", "a list opened with '[' is not closed"},
    {"end of map flow not found", "a map opened with '{' is not closed"},
    {"end of map not found", "this line is not in line with the keys above it"},
    {"end of sequence not found", "this line is not in line with the list above it"},
    {"illegal tab when looking for indentation", "lines are indented with blanks, not tabs"},
    {"illegal EOF in scalar", "a quote is not closed"},
    {"illegal document indicator in scalar", "a quote is not closed"},
    {"the referenced anchor is not defined", "'*' refers to a name that no '&' defines"},
    {"unknown token", "no value can begin with this character; put it in quotes"},
    {"bad file", "maps or lists are nested too deeply"},
});

std::string in_plain_words(const std::string& message) {
    for (const PlainWords& words : kPlainWords)
        if (words.parser == message) return std::string(words.plain);
    return message;
}

}  // namespace

std::optional<YAML::Node> read_document(const Reading& reading) {
    std::vector<YAML::Node> documents;
    try {
        documents = YAML::LoadAll(reading.text());
    } catch (const YAML::Exception& fault) {
        reading.error(fault.mark, "this cannot be read as YAML: " + in_plain_words(fault.msg),
                      "look at the indentation, colons, quotes and brackets here and just before");
        return std::nullopt;
    }
    if (documents.empty() || (documents.size() == 1 && documents.front().IsNull())) {
        reading.error(YAML::Mark::null_mark(), "the scenario is empty", kScenarioExample);
        return std::nullopt;
    }
    if (documents.size() > 1) {
        reading.error(documents[1].Mark(),
                      "a second document begins here; a scenario is one document",
                      "give each scenario a file of its own");
        return std::nullopt;
    }
    return documents.front();
}

}  // namespace rainledger
