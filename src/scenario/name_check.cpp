#include "scenario/name_check.hpp"

#include "rainledger/base/cut.hpp"
#include "scenario/plain_text.hpp"

namespace rainledger {

bool is_name(const Reading& reading, const Entry& entry, const std::string& thing) {
    const std::string& name = entry.key;
    const std::string hint = "names stand in tables and paths: use words, '-' and '_'";
    if (is_blank(name)) {
        reading.error(entry.key_mark, "a " + thing + "'s name is empty", hint);
        return false;
    }
    if (name.find_first_of(".,\n\r") != std::string::npos) {
        reading.error(entry.key_mark,
                      thing + " name " + in_quotes(name) + " holds a dot, comma or newline", hint);
        return false;
    }
    if (holds_hidden_characters(name)) {
        reading.error(entry.key_mark,
                      thing + " name " + in_quotes(name) + " holds a character that is not shown",
                      kHiddenHint);
        return false;
    }
    return true;
}

}  // namespace rainledger
