#include "rainledger/base/printable.hpp"

#include "test.hpp"

namespace rainledger {

TEST_CASE("control characters are shown, not obeyed") {
    CHECK(printable("Tannery Lane") == "Tannery Lane");
    CHECK(printable("a\x1b[31mred\n\x7f") == "a?[31mred??");
    CHECK(printable("bo\xc3\xadte \xc2\x9b"
                    "2J") == "bo\xc3\xadte ?2J");
    CHECK(printable("\xc2") == "\xc2");
}

}  // namespace rainledger
