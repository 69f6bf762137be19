#include "scenario/yaml_document.hpp"

#include <array>
#include <sstream>
#include <string>
#include <string_view>

#include <yaml-cpp/eventhandler.h>

namespace rainledger {
namespace {

constexpr const char* kLookAround =
    "look at the indentation, colons, quotes and brackets here and just before";

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

/// Follows a parser through its documents, keeping where the last one began.
class DocumentStarts : public YAML::EventHandler {
public:
    void OnDocumentStart(const YAML::Mark& mark) override { last_ = mark; }
    void OnDocumentEnd() override {}
    void OnNull(const YAML::Mark&, YAML::anchor_t) override {}
    void OnAlias(const YAML::Mark&, YAML::anchor_t) override {}
    void OnScalar(const YAML::Mark&, const std::string&, YAML::anchor_t,
                  const std::string&) override {}
    void OnSequenceStart(const YAML::Mark&, const std::string&, YAML::anchor_t,
                         YAML::EmitterStyle::value) override {}
    void OnSequenceEnd() override {}
    void OnMapStart(const YAML::Mark&, const std::string&, YAML::anchor_t,
                    YAML::EmitterStyle::value) override {}
    void OnMapEnd() override {}

    [[nodiscard]] const YAML::Mark& last() const { return last_; }

private:
    YAML::Mark last_;
};

/// Where a second document begins. Asked of the parser and not of YAML::LoadAll, which never ends
/// on a stray comma: the parser goes on offering it as one more empty document.
std::optional<YAML::Mark> second_document(const std::string& text) {
    std::istringstream stream(text);
    YAML::Parser parser(stream);
    DocumentStarts starts;
    if (!parser.HandleNextDocument(starts) || !parser.HandleNextDocument(starts))
        return std::nullopt;
    return starts.last();
}

/// Reports what follows the first document: a second one, or what cannot stand there at all.
void refuse_rest(const Reading& reading, const YAML::Mark& mark) {
    if (reading.at(mark).source_line.starts_with("---"))
        reading.error(mark, "a second document begins here; a scenario is one document",
                      "give each scenario a file of its own");
    else
        reading.error(mark, "this cannot be read as YAML: nothing of the kind can stand here",
                      kLookAround);
}

}  // namespace

std::optional<YAML::Node> read_document(const Reading& reading) {
    try {
        YAML::Node document = YAML::Load(reading.text());
        if (const auto second = second_document(reading.text())) {
            refuse_rest(reading, *second);
            return std::nullopt;
        }
        if (document.IsDefined() && !document.IsNull()) return document;
        reading.error(YAML::Mark::null_mark(), "the scenario is empty", kScenarioExample);
    } catch (const YAML::Exception& fault) {
        reading.error(fault.mark, "this cannot be read as YAML: " + in_plain_words(fault.msg),
                      kLookAround);
    }
    return std::nullopt;
}

}  // namespace rainledger
