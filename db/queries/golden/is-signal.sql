select `id`
from (select * from signals where branch_id in (select value from json_each(?))) as `signals`
where `id` = ?;
